import usual from '../vitest.config';

/** The property tests with a seed drawn anew; a failure prints the seed that brings it back. */
export default { ...usual, test: { ...usual.test, setupFiles: [] } };
