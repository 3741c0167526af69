import type { Restraint } from '@/lib/model/structure';
import type { Equilibrium } from '../statics/equilibrium';
import type { WorkRow } from './work';

/** A support component that gives way. */
export interface Springs {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  stiffness: number;
}

export function springs(eq: Equilibrium): Springs[] {
  const supports = new Map(eq.analysis.joints.map((j) => [j.id, j.support]));
  return eq.quantities.flatMap((q, column): Springs[] => {
    if (q.kind !== 'reaction') return [];
    const restraint = supports.get(q.joint)?.[q.component] as Restraint;
    return typeof restraint === 'object'
      ? [{ column, joint: q.joint, component: q.component, stiffness: restraint.spring }]
      : [];
  });
}

/** −EI0 R̄ Δ */
export function settlementRow({ joint, component, value }: Movement, unit: number, EI0: number): WorkRow {
  return { kind: 'settlement', joint, component, unit, movement: value, value: -EI0 * unit * value };
}

/** EI0 R̄ R/k */
export function springRow(s: Springs, unit: number, force: number, EI0: number): WorkRow {
  const { joint, component, stiffness } = s;
  return {
    kind: 'spring',
    joint,
    component,
    unit,
    force,
    stiffness,
    value: (EI0 * unit * force) / stiffness,
  };
}

/** A prescribed movement of a support, in its own axes. */
export interface Movement {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  value: number;
}
