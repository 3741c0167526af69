'use client';

import { type Dispatch, useEffect } from 'react';
import type { DraftChange } from './draft-history';

/** Ctrl Z undoes and Ctrl Shift Z or Ctrl Y redoes what was done to the draft, wherever the focus is on the desk. */
export function useUndoKeys(dispatch: Dispatch<DraftChange>): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      const key = event.key.toLowerCase();
      if (key !== 'z' && key !== 'y') return;
      event.preventDefault();
      dispatch({ type: key === 'y' || event.shiftKey ? 'redo' : 'undo' });
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [dispatch]);
}
