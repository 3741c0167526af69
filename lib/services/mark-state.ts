import type { MarkRow, MarkStep } from '@/db/queries/checks';

export type MarkState = 'agrees' | 'open' | MarkStep;

/** Where a mark stands by its last step. */
export function markState(kind: 'agrees' | 'correct' | 'query', last: MarkStep | null): MarkState {
  if (kind === 'agrees') return 'agrees';
  return last ?? 'open';
}

/** Nothing more is to be done about it; a correction carried on is a mark of the later check. */
export function isSettled(state: MarkState): boolean {
  return state === 'agrees' || state === 'accepted' || state === 'verified' || state === 'carried';
}

/** "line 7.5", the place of an input in words, or what of the basis is asked about. */
export function markPlace({ place, line }: Pick<MarkRow, 'place' | 'line'>): string {
  return place === 'line' ? `line ${line}` : line;
}
