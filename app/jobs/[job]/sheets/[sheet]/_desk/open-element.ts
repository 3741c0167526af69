import type { Draft, DraftLoad } from '@/lib/model/draft';
import { supportPath, supportRows } from '@/lib/model/support-rows';

/** Where the support of a joint is chosen. */
export function supportFieldOf(draft: Draft, joint: string): string | undefined {
  const row = supportRows(draft).findIndex((r) => r.joint === joint);
  return row < 0 ? undefined : `${supportPath(draft, row)}.kind`;
}

/**
 * The field of the load on a member in the case in hand. A case without a load there gets a uniform one, downward, its
 * value left to be typed; a sheet without cases has nowhere to put one.
 */
export function loadFieldOf(
  draft: Draft,
  caseIndex: number,
  member: string,
): { path: string; draft: Draft } | undefined {
  const chosen = draft.cases[caseIndex];
  if (!chosen) return undefined;
  const known = chosen.loads.findIndex((l) => l.on === member);
  if (known >= 0) return { path: `cases.${caseIndex}.loads.${known}.first`, draft };
  const loads = [...chosen.loads, blankOn(member)];
  const cases = draft.cases.map((c, i) => (i === caseIndex ? { ...c, loads } : c));
  return { path: `cases.${caseIndex}.loads.${loads.length - 1}.first`, draft: { ...draft, cases } };
}

function blankOn(member: string): DraftLoad {
  return {
    kind: 'uniform',
    on: member,
    direction: 'down',
    per: 'length',
    first: '',
    second: '',
    from: '',
    to: '',
    source: '',
  };
}
