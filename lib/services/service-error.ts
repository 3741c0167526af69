/** The person may not do this. */
export class NotAllowed extends Error {}

/** There is no such thing in this office; whether there is one in another is not said. */
export class NotFound extends Error {}
