import { endForces, memberDiagram } from './force-method/member-state';
import { type PrimaryBasis, writtenMembers, writtenRedundants } from './force-method/self-stress';
import type { SolvedForces } from './force-method/solve-redundants';
import type { Solution, StaticState } from './solution';
import type { Action } from './statics/acting-forces';
import type { Equilibrium } from './statics/equilibrium';
import type { LoadState } from './statics/load-state';
import { planStatics } from './statics/plan-statics';
import { writeStatics } from './statics/write-statics';

/** The primary structure with its states and work integrals, in the form the written calculation takes them. */
export function primaryStructure(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
): Pick<Solution, 'primary' | 'work'> {
  if (basis.local)
    return {
      primary: { written: 'results', pieces: [], loaded: {}, units: [] },
      work: { parts: {}, flexibility: [], gaps: [] },
    };
  const names = basis.redundants.map((q) => eq.quantities[q] as Solution['redundants'][number]);
  const written = names.length <= writtenRedundants && eq.bars.length <= writtenMembers;
  const plan = written ? planStatics(eq, names) : undefined;
  const lines = (action: Action) => (plan ? writeStatics(plan, action) : []);
  const loaded = Object.fromEntries(
    eq.analysis.cases.map((c) => {
      const s = solved.cases.get(c.id);
      if (!s) throw new Error(`case ${c.id} was not solved`);
      const state = stateOf(eq, (q) => s.primary[q] as number, s.load);
      return [c.id, { ...state, lines: lines({ kind: 'loads', loads: c.loads }) }];
    }),
  );
  const units = basis.states.map((unit, i): StaticState => {
    const scale = eq.scale[basis.redundants[i] as number] as number;
    const value = (q: number) => {
      const v = unit.get(q);
      return v === undefined ? 0 : v / scale;
    };
    return {
      ...stateOf(eq, value, undefined, written ? undefined : unit),
      lines: lines({ kind: 'unit', redundant: i }),
    };
  });
  const parts = Object.fromEntries([...solved.cases].map(([id, c]) => [id, c.parts.flat()]));
  const gaps = [...solved.cases].flatMap(([id, c]) =>
    c.gaps.map((g, i) => ({ i, case: id, ...g, rows: written ? g.rows : [] })),
  );
  const flexibility = solved.entries.map((f) => (written ? f : { ...f, rows: [] }));
  const pieces = plan?.bodies.list.map((b) => b.members) ?? [];
  return {
    primary: { written: written ? 'lines' : 'tables', pieces, loaded, units },
    work: { parts, flexibility, gaps },
  };
}

/** N, V, M and reactions of a state of scaled quantities; with `only`, those that it reaches. */
export function stateOf(
  eq: Equilibrium,
  value: (q: number) => number,
  load: LoadState | undefined,
  only?: ReadonlyMap<number, number>,
): Omit<StaticState, 'lines'> {
  const reached = only ? [...only.keys()].sort((a, b) => a - b) : eq.quantities.map((_, q) => q);
  const bars = only ? [...new Set(reached.map((q) => eq.barOf[q] as number))] : eq.bars.map((_, b) => b);
  const members: Record<string, ReturnType<typeof memberDiagram>> = {};
  for (const b of bars) {
    const bar = eq.bars[b];
    if (bar) members[bar.member.id] = memberDiagram(eq, b, endForces(eq, b, value, load), load);
  }
  const reactions = reached.flatMap((q) => {
    const quantity = eq.quantities[q];
    return quantity?.kind === 'reaction' ? [{ quantity, value: value(q) * (eq.scale[q] as number) }] : [];
  });
  return { reactions, members };
}
