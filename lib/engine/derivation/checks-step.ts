import type { Joint } from '@/lib/model/structure';
import type { WorkRow } from '../force-method/work';
import type { Check } from '../solution';
import type { StaticsLine } from '../statics/statics-line';
import { type Context, redundantSymbol } from './context';
import { dimensionOf, dimensions, gapDimension, per } from './dimensions';
import { negative, number, sum } from './expression';
import { finalRows } from './final-rows';
import { type Relation, relate } from './relation';
import { signedTerm } from './statics-terms';
import { referenceStiffness } from './structure-step';
import { inCase, inUnitState, type SymbolName } from './symbol-name';
import { wholeTerms } from './whole-terms';
import { gapSymbol } from './work-step';
import { type WorkTable, workTable } from './work-table';

/** Step 15: every check with its residual, and those that a person can work. */
export interface ChecksStep {
  kind: 'checks';
  checks: readonly Check[];
  /** The redundants of the second solution, where there is one, and the condition of their equations. */
  other?: { redundants: SymbolName[]; condition: number };
  /** The whole structure under its first case, with moments about a point not used before. */
  equilibrium?: { id: string; about: Joint; used: boolean; lines: { sum: Sum; relation: Relation }[] };
  /** The gap at X_1, integrated again from the final moments. */
  gap?: { id: string; redundant: SymbolName; table: WorkTable };
}

type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

export function deriveChecks(ctx: Context): ChecksStep {
  const { checks, other } = ctx.solution;
  return {
    kind: 'checks',
    checks,
    other: other && {
      redundants: other.redundants.map((q) => ctx.names.quantity(q)),
      condition: other.condition,
    },
    equilibrium: equilibriumOf(ctx),
    gap: gapOf(ctx),
  };
}

/** Written for structures whose terms still fit on a few lines. */
const most = { terms: 24 };

function equilibriumOf(ctx: Context): ChecksStep['equilibrium'] {
  const id = ctx.analysis.cases[0]?.id;
  if (id === undefined) return undefined;
  const used = new Set(
    (ctx.solution.primary.loaded[id]?.lines ?? []).flatMap((l) =>
      l.kind !== 'simultaneous' && l.sum.kind === 'moment' && l.sum.joint ? [l.sum.joint] : [],
    ),
  );
  const free = ctx.analysis.joints.filter((j) => !used.has(j.id));
  const about = free.at(-1) ?? ctx.analysis.joints.at(-1);
  if (!about || hasBareCouple(ctx, id)) return undefined;
  const sums: Sum[] = [
    { kind: 'force', x: 1, y: 0 },
    { kind: 'force', x: 0, y: 1 },
    { kind: 'moment', x: about.x, y: about.y, joint: about.id },
  ];
  const acting = { kind: 'final', id } as const;
  const lines = sums.flatMap((s) => {
    const terms = wholeTerms(ctx, id, s).map((t) => signedTerm(ctx, s, t, acting));
    if (terms.length === 0 || terms.length > most.terms) return [];
    const formula = sum(...terms.map((t) => (t.negative ? negative(t.expression) : t.expression)));
    const figures =
      s.kind === 'moment'
        ? { dimension: dimensions.moment, decimals: ctx.figures.moment }
        : { dimension: dimensions.force, decimals: ctx.figures.force };
    return [
      { sum: s, relation: relate({ letter: 'Σ' }, terms.length > 0 ? formula : number(0), figures, 0) },
    ];
  });
  return lines.length === 0 ? undefined : { id, about, used: used.has(about.id), lines };
}

/** A distributed load that changes sign and sums to nothing has a couple for its resultant, which the lines do not write. */
function hasBareCouple({ analysis }: Context, id: string): boolean {
  const loads = analysis.cases.find((c) => c.id === id)?.loads ?? [];
  return loads.some((l) => l.kind === 'distributed' && l.w1 !== 0 && l.w1 + l.w2 === 0);
}

function gapOf(ctx: Context): ChecksStep['gap'] {
  const { solution, analysis } = ctx;
  const [q] = solution.redundants;
  const id = analysis.cases[0]?.id;
  const gap = solution.work.gaps.find((g) => g.i === 0 && g.case === id);
  if (!q || id === undefined || !gap || analysis.members.some((m) => m.steps)) return undefined;
  if (gap.rows.length === 0 || gap.rows.some((r) => r.kind === 'axial' || r.kind === 'shear'))
    return undefined;
  const [unit, final] = [solution.primary.units[0], solution.cases[id]];
  if (!unit || !final) return undefined;
  const bending = analysis.members.flatMap((m) => {
    const [u, f] = [unit.members[m.id], final.members[m.id]];
    return u && f ? finalRows(m.id, u.M, f.M, m.EI / referenceStiffness(ctx)) : [];
  });
  const springs = gap.rows.flatMap((r): WorkRow[] => {
    if (r.kind !== 'spring') return r.kind === 'bending' ? [] : [r];
    const force = final.reactions.find(
      ({ quantity: x }) => x.kind === 'reaction' && x.joint === r.joint && x.component === r.component,
    )?.value;
    if (force === undefined) return [];
    return [{ ...r, force, value: ((solution.reference.value ?? 1) * r.unit * force) / r.stiffness }];
  });
  const rows = [...bending, ...springs];
  if (rows.length === 0) return undefined;
  const dims = {
    dimension: gapDimension(q),
    area: { force: 1, length: 2, temperature: 0 },
    ordinate: per(dimensions.moment, dimensionOf(q)),
  };
  const decimals = Math.max(0, ctx.figures.gap - 1);
  const symbol = { ...gapSymbol(0, id), sub: ['1'] };
  const states = {
    unit: (s: SymbolName) => inUnitState(s, 0),
    perUnit: dimensionOf(q),
    other: (s: SymbolName) => inCase(s, id),
    perOther: dimensions.pure,
  };
  const table = workTable(ctx, [{ symbol, rows, total: gap.rightSide, states }], dims, decimals);
  return { id, redundant: redundantSymbol(0), table };
}
