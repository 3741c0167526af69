import { lusolve } from 'mathjs';
import type { AnalysisInput } from '@/lib/model/analysis';

/** Stretching stiffness, as a multiple of EI per square metre, that stands for members that do not stretch. */
const nearlyRigid = 1e6;

/**
 * The straightforward way to compare with: three displacements a joint, the full matrix of all members, solved with
 * mathjs. Covers what the bench's own structures hold: even loads across beams, joint loads, held supports.
 */
export function denseSolution(input: AnalysisInput): number[] {
  const place = new Map(input.joints.map((j, i) => [j.id, i]));
  const free = input.joints.flatMap((j) =>
    (['x', 'y', 'turn'] as const).map((c) => j.support?.[c] !== 'held'),
  );
  const index: number[] = [];
  let count = 0;
  for (const f of free) index.push(f ? count++ : -1);
  const K = Array.from({ length: count }, () => new Array<number>(count).fill(0));
  const P = new Array<number>(count).fill(0);
  const add = (i: number, j: number, v: number) => {
    const [p, q] = [index[i] as number, index[j] as number];
    const row = K[p];
    if (p >= 0 && q >= 0 && row) row[q] = (row[q] as number) + v;
  };
  const put = (i: number, v: number) => {
    const p = index[i] as number;
    if (p >= 0) P[p] = (P[p] as number) + v;
  };
  const loads = input.cases[0]?.loads ?? [];
  for (const m of input.members) {
    const [a, b] = [place.get(m.start) as number, place.get(m.end) as number];
    const [p, q] = [input.joints[a], input.joints[b]];
    if (!p || !q) throw new Error('a member without joints');
    const [dx, dy] = [q.x - p.x, q.y - p.y];
    const L = Math.hypot(dx, dy);
    const [c, s] = [dx / L, dy / L];
    const EA = m.EA ?? m.EI * nearlyRigid;
    const rows = [
      { r: [-c, -s, 0, c, s, 0], k: EA / L },
      { r: [s / L, -c / L, -1, -s / L, c / L, 0], k: (4 * m.EI) / L },
      { r: [-s / L, c / L, 0, s / L, -c / L, 1], k: (4 * m.EI) / L },
    ];
    const at = [3 * a, 3 * a + 1, 3 * a + 2, 3 * b, 3 * b + 1, 3 * b + 2];
    const [, one, two] = rows;
    at.forEach((i, x) => {
      at.forEach((j, y) => {
        let v = rows.reduce((t, { r, k }) => t + k * (r[x] as number) * (r[y] as number), 0);
        if (one && two) {
          const mixed =
            (one.r[x] as number) * (two.r[y] as number) + (two.r[x] as number) * (one.r[y] as number);
          v += ((-2 * m.EI) / L) * mixed;
        }
        add(i, j, v);
      });
    });
    for (const l of loads) {
      if (l.kind !== 'distributed' || l.member !== m.id) continue;
      const w = l.w1 * c;
      [
        -s * w * (L / 2),
        c * w * (L / 2),
        (w * L * L) / 12,
        -s * w * (L / 2),
        c * w * (L / 2),
        (-w * L * L) / 12,
      ].forEach((v, i) => {
        put(at[i] as number, v);
      });
    }
  }
  for (const l of loads) if (l.kind === 'joint') put(3 * (place.get(l.joint) as number), l.x ?? 0);
  return (lusolve(K, P) as number[][]).map(([v]) => v as number);
}
