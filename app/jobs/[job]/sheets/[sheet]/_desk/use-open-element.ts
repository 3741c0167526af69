'use client';

import { useCallback } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Draft } from '@/lib/model/draft';
import { loadFieldOf, supportFieldOf } from './open-element';

interface Wants {
  draft: Draft;
  caseIndex: number;
  change: (name: string, apply: (draft: Draft) => Draft) => void;
  goTo: (path: string) => void;
}

/** Opens what belongs to an element of the drawing: a joint's support, a member's load, a load's own row. */
export function useOpenElement({ draft, caseIndex, change, goTo }: Wants): (ref: ShapeRef) => void {
  return useCallback(
    (ref) => {
      if (ref.of === 'joint' || ref.of === 'support') {
        const path = supportFieldOf(draft, ref.id);
        if (path) goTo(path);
      } else if (ref.of === 'load') {
        const [id, index] = ref.id.split(':');
        const at = draft.cases.findIndex((c) => c.id === id);
        if (at >= 0) goTo(`cases.${at}.loads.${index}.first`);
      } else if (ref.of === 'member') {
        const found = loadFieldOf(draft, caseIndex, ref.id);
        if (!found) goTo('cases');
        else {
          if (found.draft !== draft) change('load added', () => found.draft);
          goTo(found.path);
        }
      }
    },
    [draft, caseIndex, change, goTo],
  );
}
