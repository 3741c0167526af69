/** TeX or text that cannot be set: `construct` names the command, class or character at fault. */
export class TypesetError extends Error {
  readonly code = 'cannot-typeset';

  constructor(
    readonly construct: string,
    readonly source: string,
    options?: ErrorOptions,
  ) {
    super(`Cannot set ${construct} in "${source}".`, options);
    this.name = 'TypesetError';
  }
}
