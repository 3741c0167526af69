import type { Result } from '@/lib/services/result';

export interface FieldMessage {
  path: string;
  message: string;
}

/** What a form shows after it was sent: the errors, what was typed, and whether it was done. */
export interface FormState {
  errors: FieldMessage[];
  typed: Record<string, string[]>;
  done?: string;
}

export const untouched: FormState = { errors: [], typed: {} };

/** The state after a refusal. What was typed stays, except fields named secret. */
export function afterRefusal<T>(
  result: Extract<Result<T>, { ok: false }>,
  form: FormData,
  secret: string[] = [],
): FormState {
  const typed: Record<string, string[]> = {};
  for (const [name, value] of form.entries()) {
    if (typeof value !== 'string' || name.startsWith('$') || secret.includes(name)) continue;
    typed[name] = [...(typed[name] ?? []), value];
  }
  return { errors: result.errors, typed };
}

export function typedValue(state: FormState, name: string, otherwise = ''): string {
  return state.typed[name]?.[0] ?? otherwise;
}

/** The sentence at a field, also when the error lies inside it. */
export function messageAt(state: FormState, name: string): string | undefined {
  return state.errors.find((e) => e.path === name || e.path.startsWith(`${name}.`))?.message;
}
