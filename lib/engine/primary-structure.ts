import { endForces, memberDiagram } from './force-method/member-state';
import type { PrimaryBasis } from './force-method/self-stress';
import type { SolvedForces } from './force-method/solve-redundants';
import type { Solution, StaticState } from './solution';
import type { Equilibrium, LoadState } from './statics/equilibrium';
import { rigidBodies } from './statics/rigid-body';
import { writeStatics } from './statics/write-statics';

/** Up to here every state is written out; beyond it tables and matrices of the results stand alone. */
export const writtenRedundants = 30;
const writtenMembers = 150;

/** The primary structure with its states and work integrals, in the form the written calculation takes them. */
export function primaryStructure(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
): Pick<Solution, 'primary' | 'work'> {
  const names = basis.redundants.map((q) => eq.quantities[q] as Solution['redundants'][number]);
  const written = names.length <= writtenRedundants && eq.bars.length <= writtenMembers;
  const pieces = written
    ? rigidBodies(eq, names, { kind: 'loads', loads: [] })?.map((b) => b.members)
    : undefined;
  const loaded = Object.fromEntries(
    eq.analysis.cases.map((c) => {
      const s = solved.cases.get(c.id);
      if (!s) throw new Error(`case ${c.id} was not solved`);
      const lines = written ? writeStatics(eq, names, { kind: 'loads', loads: c.loads }) : [];
      return [c.id, { ...stateOf(eq, (q) => s.primary[q] as number, s.load), lines }];
    }),
  );
  const units = basis.units.map((unit, i): StaticState => {
    const scale = eq.scale[basis.redundants[i] as number] as number;
    const value = (q: number) => {
      const v = unit.get(q);
      return v === undefined ? 0 : v / scale;
    };
    return {
      ...stateOf(eq, value, undefined, written ? undefined : unit),
      lines: written ? writeStatics(eq, names, { kind: 'unit', redundant: i }) : [],
    };
  });
  const parts = Object.fromEntries([...solved.cases].map(([id, c]) => [id, c.parts.flatMap((p) => p ?? [])]));
  const gaps = [...solved.cases].flatMap(([id, c]) =>
    c.gaps.map((g, i) => ({ i, case: id, ...g, rows: written ? g.rows : [] })),
  );
  const flexibility = solved.flexibility.map((f) => (written ? f : { ...f, rows: [] }));
  return { primary: { pieces: pieces ?? [], loaded, units }, work: { parts, flexibility, gaps } };
}

/** N, V, M and reactions of a state of scaled quantities; with `only`, the members it reaches. */
export function stateOf(
  eq: Equilibrium,
  value: (q: number) => number,
  load: LoadState | undefined,
  only?: ReadonlyMap<number, number>,
): Omit<StaticState, 'lines'> {
  const reached = only && new Set([...only.keys()].flatMap((q) => memberOf(eq, q)));
  const members = eq.bars.flatMap((bar, b) =>
    reached && !reached.has(bar.member.id)
      ? []
      : [[bar.member.id, memberDiagram(eq, b, endForces(eq, b, value, load), load)] as const],
  );
  const reactions = eq.quantities.flatMap((quantity, q) =>
    quantity.kind === 'reaction' && (!only || only.has(q))
      ? [{ quantity, value: value(q) * (eq.scale[q] as number) }]
      : [],
  );
  return { reactions, members: Object.fromEntries(members) };
}

function memberOf(eq: Equilibrium, q: number): string[] {
  const quantity = eq.quantities[q];
  if (!quantity) throw new Error(`no quantity ${q}`);
  return quantity.kind === 'reaction' ? [] : [quantity.member];
}
