import type { Analysis } from '@/lib/model/analysis';

export interface Reference {
  /** EI0 as a number to reckon with: its value, or 1 while it is open (then displacements come out times EI0). */
  EI0: number;
  value?: number;
  member?: string;
}

/**
 * EI0, which all work integrals are multiplied by. Relative sheets state it (its value may be open); otherwise it is the
 * EI that most members have, the first of them in the order of the sheet.
 */
export function referenceStiffness(analysis: Analysis): Reference {
  if (analysis.basis.kind === 'relative') {
    const value = analysis.basis.EI0;
    return { EI0: value ?? 1, value };
  }
  const count = new Map<number, number>();
  for (const m of analysis.members) count.set(m.EI, (count.get(m.EI) ?? 0) + 1);
  const most = Math.max(...count.values());
  const member = analysis.members.find((m) => count.get(m.EI) === most);
  if (!member) throw new Error('an analysis without members');
  return { EI0: member.EI, value: member.EI, member: member.id };
}

/** The same analysis with every EI as a number to reckon with: multiples of EI0 become EI. */
export function withReference(analysis: Analysis, { EI0 }: Reference): Analysis {
  if (analysis.basis.kind === 'absolute' || EI0 === 1) return analysis;
  const members = analysis.members.map((m) => ({
    ...m,
    EI: m.EI * EI0,
    steps: m.steps?.map((s) => ({ ...s, EI: s.EI * EI0 })),
  }));
  return { ...analysis, members };
}
