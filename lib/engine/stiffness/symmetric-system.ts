import { backSubstitute, reduceRight, toEchelon } from './row-echelon';

/** Part of a vector of unknowns below which an entry counts as untouched. */
const untouched = 1e-8;

export interface SystemSolution {
  x: Float64Array[];
  /** Unknowns that may take any value with some of the others: each with all that it touches. */
  open: { index: number; touches: number[] }[];
}

/** Linear equations with a sparse symmetric matrix, indefinite and perhaps singular. */
export class SymmetricSystem {
  private readonly entries: Map<number, number>[];

  /** `start`: the natural size of every unknown, which the balancing of the matrix starts from. */
  constructor(private readonly start: Float64Array) {
    this.entries = Array.from({ length: start.length }, () => new Map());
  }

  get size(): number {
    return this.start.length;
  }

  /** Adds to entry (i, j) and, off the diagonal, to its mirror image. */
  add(i: number, j: number, value: number): void {
    if (value === 0) return;
    this.put(i, j, value);
    if (i !== j) this.put(j, i, value);
  }

  private put(i: number, j: number, value: number): void {
    const row = this.entries[i];
    if (!row) throw new Error(`the system has no row ${i}`);
    const before = row.get(j);
    row.set(j, before === undefined ? value : before + value);
  }

  /** Undefined when a right side contradicts the equations. Open unknowns are zero. */
  solve(rights: readonly Float64Array[]): SystemSolution | undefined {
    const scale = this.balance();
    const matrix = this.entries.map((row, i) => {
      const scaled = new Map<number, number>();
      for (const [j, v] of row) scaled.set(j, v * at(scale, i) * at(scale, j));
      return scaled;
    });
    const echelon = toEchelon(matrix);
    const x: Float64Array[] = [];
    for (const right of rights) {
      const b = right.map((v, i) => v * at(scale, i));
      const found = new Float64Array(this.size);
      const reduced = reduceRight(echelon, b);
      const size = largest(reduced);
      if (echelon.left.some((r) => Math.abs(at(reduced, r)) > untouched * size)) return undefined;
      backSubstitute(echelon, reduced, found);
      for (let round = 0; round < 2; round++) {
        const better = new Float64Array(this.size);
        backSubstitute(echelon, reduceRight(echelon, residual(matrix, found, b)), better);
        for (let i = 0; i < found.length; i++) found[i] = at(found, i) + at(better, i);
      }
      x.push(found.map((v, i) => v * at(scale, i)));
    }
    const open = echelon.pivots.flatMap((pivot, index) => {
      if (pivot !== undefined) return [];
      const z = new Float64Array(this.size);
      z[index] = 1;
      backSubstitute(echelon, new Float64Array(this.size), z);
      const least = untouched * largest(z);
      return [{ index, touches: [...z.keys()].filter((i) => Math.abs(at(z, i)) > least) }];
    });
    return { x, open };
  }

  /** Powers of two that bring the largest entry of every row to about 1. Ruiz, RAL-TR-2001-034. */
  private balance(): Float64Array {
    let scale = this.start.map((v) => 2 ** Math.round(Math.log2(v)));
    for (let round = 0; round < 12; round++) {
      const next = scale.map((own, i) => {
        let most = 0;
        for (const [j, v] of this.entries[i] as Map<number, number>)
          most = Math.max(most, Math.abs(v) * at(scale, j));
        return most > 0 ? own * 2 ** Math.round(-Math.log2(most * own) / 2) : own;
      });
      if (next.every((v, i) => v === at(scale, i))) break;
      scale = next;
    }
    return scale;
  }
}

function residual(
  matrix: readonly ReadonlyMap<number, number>[],
  x: Float64Array,
  b: Float64Array,
): Float64Array {
  const r = Float64Array.from(b);
  matrix.forEach((row, i) => {
    for (const [j, v] of row) r[i] = at(r, i) - v * at(x, j);
  });
  return r;
}

function largest(list: Float64Array): number {
  return list.reduce((most, v) => Math.max(most, Math.abs(v)), 0);
}

function at(list: Float64Array, i: number): number {
  return list[i] as number;
}
