import type { Solution } from '@/lib/engine/solution';

/** The part of a solution that a revision freezes and a package carries. */
export function storedResults({ cases, X, checks, envelopes }: Solution) {
  return { reactions: cases, X, checks, envelopes };
}
