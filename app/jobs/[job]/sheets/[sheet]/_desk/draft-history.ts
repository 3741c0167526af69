import type { Draft } from '@/lib/model/draft';

/** The draft in hand with what came before and what was undone. */
export interface DraftHistory {
  past: Draft[];
  present: Draft;
  future: Draft[];
  /** The place last written to, and when: quick typing in one field is one step to undo. */
  last?: { path: string; at: number };
}

export type DraftChange =
  | { type: 'edit'; path: string; at: number; apply: (draft: Draft) => Draft }
  | { type: 'undo' }
  | { type: 'redo' }
  | { type: 'replace'; draft: Draft };

const oneStep = 900;
const kept = 200;

/** The next history after a change; edits to one field within a second count as one. */
export function changeDraft(history: DraftHistory, change: DraftChange): DraftHistory {
  const { past, present, future } = history;
  switch (change.type) {
    case 'edit': {
      const next = change.apply(present);
      if (next === present) return history;
      const joined = history.last?.path === change.path && change.at - history.last.at < oneStep;
      return {
        past: joined ? past : [...past, present].slice(-kept),
        present: next,
        future: [],
        last: { path: change.path, at: change.at },
      };
    }
    case 'undo': {
      const before = past.at(-1);
      return before ? { past: past.slice(0, -1), present: before, future: [present, ...future] } : history;
    }
    case 'redo': {
      const [next, ...rest] = future;
      return next ? { past: [...past, present], present: next, future: rest } : history;
    }
    case 'replace':
      return { past: [...past, present], present: change.draft, future: [] };
  }
}
