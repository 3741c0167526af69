import type { Analysis } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';

/** Places nearer to an end than this part of the length are that end: an inclined length is never a round number. */
const near = 1e-9;

/** Whether a place along a member of length L lies off it. */
export function offMember(s: number, L: number): boolean {
  return s < -near * L || s > L * (1 + near);
}

/** A place along a member, moved onto an end that it nearly is. */
export function snap(s: number, L: number): number {
  if (Math.abs(s) <= near * L) return 0;
  return Math.abs(s - L) <= near * L ? L : s;
}

/** The same analysis with all places of loads and displacements snapped to the ends of their members. */
export function snapPlaces(analysis: Analysis): Analysis {
  const at = new Map(analysis.joints.map((j) => [j.id, j]));
  const lengths = new Map(
    analysis.members.map((m) => {
      const [a, b] = [at.get(m.start), at.get(m.end)];
      if (!a || !b) throw new Error(`member ${m.id} has no joint`);
      return [m.id, Math.hypot(b.x - a.x, b.y - a.y)];
    }),
  );
  const place = (member: string, s: number) => snap(s, lengths.get(member) as number);
  const snapped = (load: Load): Load => {
    switch (load.kind) {
      case 'point':
      case 'couple':
        return { ...load, at: place(load.member, load.at) };
      case 'distributed':
        return {
          ...load,
          from: load.from === undefined ? undefined : place(load.member, load.from),
          to: load.to === undefined ? undefined : place(load.member, load.to),
        };
      default:
        return load;
    }
  };
  return {
    ...analysis,
    cases: analysis.cases.map((c) => ({ ...c, loads: c.loads.map(snapped) })),
    displacements: analysis.displacements.map((d) => ({ ...d, at: place(d.member, d.at) })),
  };
}
