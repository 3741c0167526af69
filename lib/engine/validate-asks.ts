import type { Analysis } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import { offMember } from './snap-places';

/** Displacements that are asked for must lie on members. */
export function validateAsks(analysis: Analysis): Refusal | undefined {
  const at = new Map(analysis.joints.map((j) => [j.id, j]));
  const members = new Map(analysis.members.map((m) => [m.id, m]));
  for (const [i, ask] of analysis.displacements.entries()) {
    const path = `displacements.${i}`;
    const m = members.get(ask.member);
    const [a, b] = [at.get(m?.start ?? ''), at.get(m?.end ?? '')];
    if (!m || !a || !b)
      return {
        code: 'unknown-member',
        message: `There is no member ${ask.member}.`,
        place: { path, member: ask.member },
      };
    if (offMember(ask.at, Math.hypot(b.x - a.x, b.y - a.y))) {
      return {
        code: 'ask-off-member',
        message: `The deflection asked for lies off member ${m.id}.`,
        place: { path, member: m.id },
      };
    }
  }
  return undefined;
}
