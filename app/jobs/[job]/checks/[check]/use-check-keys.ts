'use client';

import { useEffect } from 'react';
import type { CheckMark } from './check-mark';

const kinds: Record<string, CheckMark['kind']> = { a: 'agrees', c: 'correct', q: 'query' };
const steps: Record<string, number> = { j: 1, arrowdown: 1, k: -1, arrowup: -1 };

interface Wants {
  working: boolean;
  onStep: (by: number) => void;
  onKind: (kind: CheckMark['kind']) => void;
}

/** J and K or the arrows move from line to line; A, C and Q choose the mark. Never while something is typed. */
export function useCheckKeys({ working, onStep, onKind }: Wants): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const at = event.target instanceof HTMLElement ? event.target : undefined;
      const written = at?.matches('textarea, select, input:not([type="radio"])');
      if (!working || written || event.ctrlKey || event.metaKey || event.altKey) return;
      const key = event.key.toLowerCase();
      const step = steps[key];
      // The arrows already mean something where a radio button or a scrolled table has the focus.
      if (step !== undefined && !(key.startsWith('arrow') && at?.matches('input, [tabindex]'))) {
        event.preventDefault();
        onStep(step);
      }
      const kind = kinds[key];
      if (kind) onKind(kind);
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [working, onStep, onKind]);
}
