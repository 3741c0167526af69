/** Joints where more members meet than this come last, so that what hangs on them does not fill the matrix. */
const manyMembers = 12;

/**
 * Joints in an order in which neighbours stand close together: level by level from a joint at the rim, those with few
 * neighbours first. Cuthill and McKee, Proc. 24th ACM Conf. (1969); the rim found as by Gibbs, Poole and Stockmeyer (1976).
 */
export function orderJoints(count: number, pairs: readonly (readonly [number, number])[]): number[] {
  const sets = Array.from({ length: count }, () => new Set<number>());
  for (const [a, b] of pairs) {
    sets[a]?.add(b);
    sets[b]?.add(a);
  }
  const hubs = [...sets.keys()].filter((j) => (sets[j] as Set<number>).size > manyMembers);
  for (const hub of hubs) for (const j of sets[hub] as Set<number>) sets[j]?.delete(hub);
  const near = sets.map((set) => [...set]);
  const degree = (j: number) => (near[j] as number[]).length;
  const done = new Set(hubs);
  const order: number[] = [];
  for (let start = 0; start < count; start++) {
    if (done.has(start)) continue;
    const rim = levels(near, start).at(-1) as number[];
    const first = rim.reduce((a, b) => (degree(b) < degree(a) ? b : a));
    for (const level of levels(near, first)) {
      for (const j of level) done.add(j);
      order.push(...level);
    }
  }
  return [...order, ...hubs];
}

function levels(near: readonly number[][], start: number): number[][] {
  const found: number[][] = [[start]];
  const seen = new Set([start]);
  const degree = (j: number) => (near[j] as number[]).length;
  for (;;) {
    const next = (found.at(-1) as number[]).flatMap((j) => {
      const fresh = (near[j] as number[]).filter((k) => !seen.has(k)).sort((a, b) => degree(a) - degree(b));
      for (const k of fresh) seen.add(k);
      return fresh;
    });
    if (next.length === 0) return found;
    found.push(next);
  }
}
