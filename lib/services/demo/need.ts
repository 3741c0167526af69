import type { Result } from '../result';

/** The value of a result that must be good for the demo to stand. */
export function need<T>(result: Result<T>): T {
  if (!result.ok)
    throw new Error(`the demo could not be filled: ${result.errors.map((e) => e.message).join(' ')}`);
  return result.value;
}
