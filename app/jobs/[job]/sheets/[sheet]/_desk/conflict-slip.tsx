'use client';

import { type Draft, draft as draftSchema } from '@/lib/model/draft';
import type { KeepingState } from './use-keeping';

interface Props {
  state: Extract<KeepingState, { state: 'conflict' }>;
  onMine: () => void;
  onTheirs: (draft: Draft) => void;
}

const when = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' });

/** Somebody else kept another version: the person chooses which to go on from; the other stays in the history. */
export function ConflictSlip({ state, onMine, onTheirs }: Props) {
  const theirs = draftSchema.safeParse(state.theirs);
  return (
    <section className="conflict" role="alertdialog" aria-label="Two versions">
      <h2>Two versions of this sheet</h2>
      <p>
        {state.by} kept another version at {when.format(new Date(state.at))}. Yours is still here. If you go
        on with yours, theirs stays in the history; if you go on with theirs, undo brings yours back.
      </p>
      <div className="flex gap-3 mt-3">
        <button type="button" className="btn p" onClick={onMine}>
          Go on with mine
        </button>
        {theirs.success ? (
          <button type="button" className="btn" onClick={() => onTheirs(theirs.data)}>
            Go on with theirs
          </button>
        ) : null}
      </div>
    </section>
  );
}
