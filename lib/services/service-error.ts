/** The person may not do this. */
export class NotAllowed extends Error {}

/** There is no such thing in this office; whether there is one in another is not said. */
export class NotFound extends Error {}

/** What the person can mend or has to know: a code, the field it is about ('' for the whole form) and a plain sentence. */
export class Refused extends Error {
  constructor(
    readonly code: string,
    readonly path: string,
    message: string,
  ) {
    super(message);
  }
}

/** Ends the verb; its transaction is undone and the person reads the sentence. */
export function refuse(code: string, path: string, message: string): never {
  throw new Refused(code, path, message);
}
