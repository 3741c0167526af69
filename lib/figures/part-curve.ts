import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import type { MomentPart } from '@/lib/engine/force-method/work';

/** Shapes over ξ = 0 … 1 with the tall end at ξ = 1, as coefficients of powers of ξ. */
const shapes = {
  rectangle: [1],
  triangle: [0, 1],
  parabola: [0, 4, -4],
  'half-parabola': [0, 2, -1],
  spandrel: [0, 0, 1],
  'cubic-spandrel': [0, 0, 0, 1],
  /** Simple span under a load that grows to ξ = 1: ξ − ξ³, area ¼, centroid 8/15. */
  cubic: [0, 1, 0, -1],
} as const;

/** The curve of a named shape, on its stretch of the member. */
export function partCurve(part: MomentPart): PiecewisePolynomial {
  const { shape, from, to, height, tall, area, centroid } = part;
  const length = to - from;
  if (shape === 'triangle' && tall === 'peak') {
    // The centroid of a triangle with its peak at a lies at (l + a)/3.
    const peak = 3 * (centroid - from) - length;
    return [
      { from, to: from + peak, c: [0, height / peak] },
      { from: from + peak, to, c: [height, -height / (length - peak)] },
    ];
  }
  if (shape === 'cubic') {
    const k = (4 * area) / length;
    const grows = centroid - from > length / 2;
    return [
      {
        from,
        to,
        c: overStretch(
          shapes.cubic.map((v) => v * k),
          length,
          !grows,
        ),
      },
    ];
  }
  return [
    {
      from,
      to,
      c: overStretch(
        shapes[shape].map((v) => v * height),
        length,
        tall === 'start',
      ),
    },
  ];
}

/** Coefficients in ξ turned into powers of s − from; mirrored when the tall end is the start. */
function overStretch(coefficients: readonly number[], length: number, mirrored: boolean): number[] {
  if (!mirrored) return coefficients.map((v, k) => v / length ** k);
  const turned = coefficients.map(() => 0);
  coefficients.forEach((v, k) => {
    let binomial = 1;
    for (let j = 0; j <= k; j++) {
      turned[j] = (turned[j] ?? 0) + v * binomial * (-1) ** j;
      binomial = (binomial * (k - j)) / (j + 1);
    }
  });
  return turned.map((v, k) => v / length ** k);
}
