import type { Member } from '@/lib/model/structure';

/** A length of a member with one stiffness. EA and GAs are absent where it neither stretches nor shears. */
export interface Stretch {
  from: number;
  to: number;
  EI: number;
  EA?: number;
  GAs?: number;
}

/** The member from start to end as lengths of one stiffness, at its steps. */
export function stretches(member: Member, L: number): Stretch[] {
  const steps = [{ from: 0, EI: member.EI, EA: member.EA, GAs: member.GAs }, ...(member.steps ?? [])];
  return steps.map((step, i) => ({ ...step, to: steps[i + 1]?.from ?? L }));
}
