import { type Expression, negative, number, quotient, sum, type Value, valuesOf } from './expression';
import { type Relation, relate } from './relation';
import { type CollectedRow, times } from './together';

/**
 * Two equations with two unknowns by the rule of determinants: u₁ = (c₁ a₂₂ − c₂ a₁₂)/(a₁₁ a₂₂ − a₁₂ a₂₁). Cramer,
 * Introduction à l'analyse des lignes courbes algébriques (1750), appendix I, as it is commonly given. The rows come back
 * with the figures that both lines ask of them.
 */
export function solvePair(
  rows: readonly CollectedRow[],
  unknowns: readonly Value[],
): { rows: CollectedRow[]; solution: Relation[] } {
  const first = linesOf(rows, unknowns);
  const asked = first.flatMap((r) => valuesOf(r.formula));
  const finer = (v: Value): Value => {
    const alike = asked.filter((a) => Math.abs(a.value) === Math.abs(v.value)).map((a) => a.decimals);
    return { ...v, decimals: Math.max(v.decimals, ...alike) };
  };
  const fitted = rows.map((row) => ({
    coefficients: row.coefficients.map((a) => a && finer(a)),
    right: finer(row.right),
  }));
  return { rows: fitted, solution: linesOf(fitted, unknowns) };
}

function linesOf(rows: readonly CollectedRow[], [u, v]: readonly Value[]): Relation[] {
  const [one, two] = rows;
  if (!one || !two || !u?.symbol || !v?.symbol) throw new Error('a pair of equations is two');
  const [a, b] = one.coefficients;
  const [c, d] = two.coefficients;
  const under = difference([a, d], [b, c]);
  const line = (unknown: Value, over: Expression) =>
    over.kind === 'number'
      ? relate(unknown.symbol ?? { letter: '' }, number(0), unknown, 0)
      : relate(unknown.symbol ?? { letter: '' }, quotient(over, under), unknown, unknown.value);
  return [
    line(u, difference([d, one.right], [b, two.right])),
    line(v, difference([a, two.right], [c, one.right])),
  ];
}

type Pair = readonly [Value | undefined, Value | undefined];

/** p₁ p₂ − q₁ q₂ without products that are zero. */
function difference(p: Pair, q: Pair): Expression {
  const [plus, minus] = [p, q].map(([x, y]) =>
    x && y && x.value !== 0 && y.value !== 0 ? [times(x, y)] : [],
  );
  const terms = [...(plus ?? []), ...(minus ?? []).map(opposite)];
  return terms.length === 0 ? number(0) : sum(...terms);
}

const opposite = (e: Expression): Expression => (e.kind === 'negative' ? e.of : negative(e));
