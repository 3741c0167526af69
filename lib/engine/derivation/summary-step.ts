import type { MemberDiagrams } from '../diagrams/member-diagrams';
import { extremes } from '../diagrams/piecewise';
import type { Context } from './context';
import type { Value } from './expression';
import { reactionValue } from './primary-step';

/** The greatest of a kind in one member, and the case or combination that gives it. */
export interface Demand {
  value: number;
  by: string;
}

/** Step 16: what the design of members and foundations takes from this sheet. */
export interface SummaryStep {
  kind: 'summary';
  /** Demands come from combinations where the sheet has any for strength, else from single cases. */
  from: 'combinations' | 'cases';
  members: {
    member: string;
    compression?: Demand;
    tension?: Demand;
    V: Demand;
    positive?: Demand;
    negative?: Demand;
  }[];
  /** Forces of the structure on its supports, opposite to the reactions. */
  supports: {
    joint: string;
    component: 'x' | 'y' | 'turn';
    dimension: Value['dimension'];
    decimals: number;
    /** Opposite to the reaction, except that vertical forces are counted downward: what the foundation bears. */
    cases: Record<string, number>;
    combinations: Record<string, number>;
  }[];
  /** Supports that are pulled up under some combination (or case). */
  uplift: { joint: string; by: string }[];
}

export function deriveSummary(ctx: Context): SummaryStep {
  const { analysis, solution } = ctx;
  const strength = new Set(analysis.combinations.filter((c) => c.purpose === 'strength').map((c) => c.id));
  const combined = solution.combinations.filter((c) => strength.has(c.id));
  const from = combined.length > 0 ? 'combinations' : 'cases';
  const states =
    from === 'combinations'
      ? combined
      : analysis.cases.flatMap(({ id }) => {
          const c = solution.cases[id];
          return c ? [{ id, members: c.members, reactions: c.reactions }] : [];
        });
  const members = analysis.members.map((m) => {
    const list = states.flatMap((s) => {
      const d = s.members[m.id];
      return d ? [{ by: s.id, d }] : [];
    });
    return { member: m.id, ...demandsOf(list) };
  });
  const supports = (states[0]?.reactions ?? []).flatMap((r, k) => {
    const { quantity: q } = r;
    if (q.kind !== 'reaction') return [];
    // Down on the foundation is up on the structure: the reaction itself; other components turn their sign.
    const sign = q.component === 'y' ? 1 : -1;
    const shown = reactionValue(ctx, r, (s) => s);
    const of = (list: readonly { value: number }[] | undefined) => sign * (list?.[k]?.value ?? Number.NaN);
    return [
      {
        joint: q.joint,
        component: q.component,
        dimension: shown.dimension,
        decimals: shown.decimals,
        cases: Object.fromEntries(analysis.cases.map((c) => [c.id, of(solution.cases[c.id]?.reactions)])),
        combinations: Object.fromEntries(combined.map((c) => [c.id, of(c.reactions)])),
      },
    ];
  });
  const uplift = states.flatMap((s) =>
    s.reactions.flatMap(({ quantity: q, value }) =>
      q.kind === 'reaction' && q.component === 'y' && value < -1e-9 ? [{ joint: q.joint, by: s.id }] : [],
    ),
  );
  return { kind: 'summary', from, members, supports, uplift };
}

type Three = Pick<MemberDiagrams, 'N' | 'V' | 'M'>;

function demandsOf(list: readonly { by: string; d: Three }[]) {
  const [N, V, M] = [rangeOf(list, 'N'), rangeOf(list, 'V'), rangeOf(list, 'M')];
  const kept = (d: Demand, sign: number, size: number) => (sign * d.value > 1e-9 * size ? d : undefined);
  return {
    compression: kept(N.least, -1, N.size),
    tension: kept(N.greatest, 1, N.size),
    V: V.largest,
    positive: kept(M.greatest, 1, M.size),
    negative: kept(M.least, -1, M.size),
  };
}

/** The greatest, the least and the largest by size of one kind of force, each the first of its value in the list. */
function rangeOf(list: readonly { by: string; d: Three }[], which: 'N' | 'V' | 'M') {
  const all = list.flatMap(({ by, d }): Demand[] => {
    const { max, min } = extremes(d[which]);
    return [
      { by, value: max.value },
      { by, value: min.value },
    ];
  });
  const pick = (better: (a: Demand, b: Demand) => boolean): Demand =>
    all.reduce((a, b) => (better(b, a) ? b : a), all[0] ?? { by: '', value: 0 });
  const largest = pick((a, b) => Math.abs(a.value) > Math.abs(b.value));
  return {
    greatest: pick((a, b) => a.value > b.value),
    least: pick((a, b) => a.value < b.value),
    largest,
    size: Math.max(Math.abs(largest.value), 1e-300),
  };
}
