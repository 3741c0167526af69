import { type Coefficients, derive, evaluate } from './polynomial';

/** Below this part of the largest term a coefficient is rounding, not a power of the polynomial. */
const negligible = 1e-13;

/**
 * Real roots in [a, b] in order. Between two neighbouring roots of the derivative a polynomial is monotone, so each
 * sign change encloses one root, found by bisection to the last bit; degrees one and two have their formulas. A
 * polynomial that is zero throughout has none.
 */
export function rootsBetween(c: Coefficients, a: number, b: number): number[] {
  const reach = Math.max(Math.abs(a), Math.abs(b));
  const terms = c.map((k, i) => Math.abs(k) * reach ** i);
  const size = Math.max(...terms, 0);
  let degree = c.length - 1;
  while (degree >= 0 && (terms[degree] as number) <= negligible * size) degree--;
  if (degree <= 0) return [];
  const p = c.slice(0, degree + 1);
  if (degree === 1) return within([-(p[0] as number) / (p[1] as number)], a, b);
  if (degree === 2) return within(quadratic(p as [number, number, number], negligible * size), a, b);
  const ends = [a, ...rootsBetween(derive(p), a, b), b];
  const roots: number[] = [];
  for (let i = 1; i < ends.length; i++) {
    const root = bisect(p, ends[i - 1] as number, ends[i] as number, negligible * size);
    if (root !== undefined && roots.at(-1) !== root) roots.push(root);
  }
  return roots;
}

/** Roots that rounding has put just outside an end belong to that end. */
function within(roots: readonly number[], a: number, b: number): number[] {
  const slack = negligible * Math.max(Math.abs(a), Math.abs(b));
  const inside = roots.filter((x) => x >= a - slack && x <= b + slack);
  return [...new Set(inside.map((x) => Math.min(b, Math.max(a, x))))].sort((x, y) => x - y);
}

/** Without cancellation: the larger root first, the other from their product. Press et al., Numerical Recipes, §5.6. */
function quadratic([c, b, a]: [number, number, number], small: number): number[] {
  const peak = c - (b * b) / (4 * a);
  if (Math.abs(peak) <= small) return [-b / (2 * a)];
  const inside = b * b - 4 * a * c;
  if (inside < 0) return [];
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(inside)) / 2;
  return q === 0 ? [0] : [q / a, c / q];
}

function bisect(p: Coefficients, from: number, to: number, small: number): number | undefined {
  let lo = from;
  let hi = to;
  const atLo = evaluate(p, lo);
  const atHi = evaluate(p, hi);
  if (Math.abs(atLo) <= small) return lo;
  if (Math.abs(atHi) <= small) return hi;
  if (atLo > 0 === atHi > 0) return undefined;
  for (;;) {
    const mid = (lo + hi) / 2;
    if (mid === lo || mid === hi) return mid;
    if (evaluate(p, mid) > 0 === atLo > 0) lo = mid;
    else hi = mid;
  }
}
