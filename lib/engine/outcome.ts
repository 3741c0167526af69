import type { Refusal } from '@/lib/model/refusal';

/** A result, or the reason there is none. Nothing a caller can mend is thrown. */
export type Outcome<T> = { ok: true; value: T } | { ok: false; refusal: Refusal };
