import type { z } from 'zod';

/** A value, or what the person can mend, field by field. An error of the whole form has an empty path. */
export type Result<T> = { ok: true; value: T } | { ok: false; errors: ServiceProblem[] };

export interface ServiceProblem {
  code: string;
  path: string;
  message: string;
}

export const done = <T>(value: T): Result<T> => ({ ok: true, value });

export const mend = (code: string, path: string, message: string): Result<never> => ({
  ok: false,
  errors: [{ code, path, message }],
});

/** What zod found, as sentences at fields. */
export function unread(error: z.ZodError): Result<never> {
  return {
    ok: false,
    errors: error.issues.map((i) => ({ code: 'input', path: i.path.join('.'), message: i.message })),
  };
}
