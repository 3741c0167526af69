import type { SolvedCase } from '../force-method/solve-redundants';
import type { CaseResult } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import type { StiffnessCase } from '../stiffness/solve-stiffness';
import { difference, type Pair } from './difference';

/** Reactions and end forces of one case by both ways, each relative to the largest value of its kind. */
export function secondWay(eq: Equilibrium, c: SolvedCase, one: CaseResult, other: StiffnessCase): number {
  const pairs: Pair[] = [];
  for (const r of one.reactions) {
    if (r.quantity.kind !== 'reaction') continue;
    const name = `${r.quantity.joint}:${r.quantity.component}`;
    if (other.open.has(name)) continue;
    pairs.push({
      a: r.value,
      b: other.reactions.get(name) as number,
      moment: r.quantity.component === 'turn',
    });
  }
  eq.bars.forEach((bar, b) => {
    const d = one.members[bar.member.id];
    const m = other.members[b];
    if (!d || !m) return;
    const start = (f: typeof d.M) => f[0]?.c[0] as number;
    if (!other.open.has(bar.member.id)) pairs.push({ a: start(d.N), b: m.N, moment: false });
    pairs.push({ a: start(d.M), b: m.M0, moment: true });
    const last = d.M.at(-1);
    const end = last?.c.reduce((t, c, k) => t + c * (last.to - last.from) ** k, 0) as number;
    pairs.push({ a: end, b: m.M1, moment: true });
  });
  return difference(eq, c, pairs);
}
