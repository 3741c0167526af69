import type { Context } from './context';

/** Step 1: what the calculation rests on. */
export interface BasisStep {
  kind: 'basis';
  beam: boolean;
  units: Context['analysis']['units'];
  /** Deformations that enter beside bending. */
  stretches: boolean;
  shears: boolean;
  springs: boolean;
  settlements: boolean;
  temperature: boolean;
  misfits: boolean;
  /** Forces depend on EI0 itself, not only on the multiples. */
  needsEI0: boolean;
  relative: boolean;
  EI0Given: boolean;
  openAxial: readonly string[];
  figures: Context['figures'];
  cases: Context['analysis']['cases'];
  combinations: Context['analysis']['combinations'];
  displacements: number;
  degree: number;
}

export function deriveBasis(ctx: Context): BasisStep {
  const { analysis, solution, names, figures } = ctx;
  const loads = analysis.cases.flatMap((c) => c.loads);
  const has = (kind: (typeof loads)[number]['kind']) => loads.some((l) => l.kind === kind);
  const springs = analysis.joints.some(({ support }) =>
    [support?.x, support?.y, support?.turn].some((r) => typeof r === 'object'),
  );
  const stretches = analysis.members.some((m) => m.EA !== undefined);
  const shears = analysis.members.some((m) => m.GAs !== undefined);
  const moved = has('settlement') || has('temperature') || has('misfit');
  return {
    kind: 'basis',
    beam: names.beam,
    units: analysis.units,
    stretches,
    shears,
    springs,
    settlements: has('settlement'),
    temperature: has('temperature'),
    misfits: has('misfit'),
    needsEI0: springs || stretches || shears || moved,
    relative: analysis.basis.kind === 'relative',
    EI0Given: solution.reference.value !== undefined,
    openAxial: solution.determinacy.openAxial,
    figures,
    cases: analysis.cases,
    combinations: analysis.combinations,
    displacements: analysis.displacements.length,
    degree: solution.redundants.length,
  };
}
