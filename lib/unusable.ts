/** What whoever starts the server has to mend, in plain words: a setting, or what a setting leads to. */
export class Unusable extends Error {}
