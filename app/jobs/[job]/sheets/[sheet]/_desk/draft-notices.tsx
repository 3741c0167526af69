'use client';

import { useEffect, useState } from 'react';
import type { Draft } from '@/lib/model/draft';
import { ConflictSlip } from './conflict-slip';
import { type KeepingState, readBackup } from './use-keeping';

interface Props {
  sheetId: string;
  version: number;
  state: KeepingState;
  goOn: (version: number, taken: Draft | undefined) => void;
  replace: (draft: Draft) => void;
}

/** What asks for a choice about the draft itself: changes this browser still holds, or somebody else's version. */
export function DraftNotices({ sheetId, version, state, goOn, replace }: Props) {
  const [waiting, setWaiting] = useState<Draft | undefined>();
  useEffect(() => setWaiting(readBackup(sheetId, version)), [sheetId, version]);
  return (
    <>
      {waiting ? (
        <p className="ans" role="status">
          This browser holds changes that were not handed over.{' '}
          <button
            type="button"
            className="linkish"
            onClick={() => {
              replace(waiting);
              setWaiting(undefined);
            }}
          >
            Take them back
          </button>
        </p>
      ) : null}
      {state.state === 'conflict' ? (
        <ConflictSlip
          state={state}
          onMine={() => goOn(state.version, undefined)}
          onTheirs={(theirs) => {
            goOn(state.version, theirs);
            replace(theirs);
          }}
        />
      ) : null}
    </>
  );
}
