import type { Draft } from '@/lib/model/draft';
import { supportRows } from '@/lib/model/support-rows';
import type { DeskStepKey } from './desk-step';

const counted = (n: number, one: string) => `${n} ${one}${n === 1 ? '' : 's'}`;

/** What a complete step holds, in a few words under its name: "3 cases, 7 loads". */
export function stepWords(draft: Draft, step: DeskStepKey): string {
  const g = draft.geometry;
  switch (step) {
    case 'geometry':
      if (g.shape === 'beam') return counted(g.spans.length, 'span');
      if (g.shape === 'frame')
        return `${counted(g.joints.length, 'joint')}, ${counted(g.members.length, 'member')}`;
      return 'complete';
    case 'supports':
      return counted(supportRows(draft).filter((r) => r.support.kind !== 'free').length, 'support');
    case 'loads': {
      const loads = draft.cases.reduce((n, c) => n + c.loads.length, 0);
      return `${counted(draft.cases.length, 'case')}, ${counted(loads, 'load')}`;
    }
    case 'combinations': {
      const own = draft.combinations.length;
      if (draft.combinationSet === '') return own === 0 ? 'none asked for' : `${own} of your own`;
      return own === 0 ? 'published set' : `published set, ${own} own`;
    }
    default:
      return 'complete';
  }
}
