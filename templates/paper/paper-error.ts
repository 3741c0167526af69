/** A block that cannot be printed: `cannot-set` for its text or TeX, `does-not-fit` for its size. */
export class PaperError extends Error {
  constructor(
    readonly code: 'cannot-set' | 'does-not-fit',
    /** The line's number on its sheet. */
    readonly block: string,
    detail: string,
    options?: ErrorOptions,
  ) {
    super(`Line ${block} cannot be printed. ${detail}`, options);
    this.name = 'PaperError';
  }
}
