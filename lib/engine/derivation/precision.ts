import { type Expression, evaluate, mapValues, printedValue, type Value, valuesOf } from './expression';
import { roundTo } from './round-to';

/** A substitution worked with its printed figures stays within this many units of the last figure of its result. */
export const reworkTolerance = 0.9;

/** No number is printed with more decimals than this; a double has no more to give. */
const most = 12;

/** What a result is printed with. */
export interface Figures {
  decimals: number;
  scale?: number;
}

/**
 * The formula with enough figures: while its printed figures do not give the printed result, the value whose rounding
 * moves the result most gets one figure more. Throws when the formula does not give the result at full precision,
 * since no figures could cure that.
 */
export function fitFigures(formula: Expression, result: number, figures: Figures): Expression {
  const scale = figures.scale ?? 1;
  const unit = 10 ** -figures.decimals / scale;
  const printed = roundTo(result * scale, figures.decimals) / scale;
  if (Math.abs(evaluate(formula) - result) > 0.01 * unit + 1e-7 * Math.abs(result)) {
    throw new Error(`a formula gives ${evaluate(formula)} where its result is ${result}`);
  }
  let fitted = formula;
  while (Math.abs(evaluate(fitted, 'printed') - printed) > reworkTolerance * unit) {
    const worst = worstValue(fitted);
    if (!worst) break;
    fitted = mapValues(fitted, (v) => (v === worst ? { ...v, decimals: v.decimals + 1 } : v));
  }
  return fitted;
}

/** The value whose rounding moves the formula most, of those that can still get a figure. */
function worstValue(formula: Expression): Value | undefined {
  const printed = evaluate(formula, 'printed');
  let worst: { value: Value; effect: number } | undefined;
  for (const value of valuesOf(formula)) {
    if (value.decimals >= most || printedValue(value) === value.value) continue;
    const exact = mapValues(formula, (v) => (v === value ? { ...v, decimals: most } : v));
    const effect = Math.abs(evaluate(exact, 'printed') - printed);
    if (!worst || effect > worst.effect) worst = { value, effect };
  }
  return worst?.value;
}

/** How one column of a table follows from others. `work` gets the row's values by column name. */
export interface ColumnRule<K extends string> {
  column: K;
  from: readonly K[];
  work(row: Readonly<Record<K, number>>): number;
}

type Row<K extends string> = Readonly<Partial<Record<K, number>>>;

/**
 * Decimals of the columns of a table, so that every computed cell worked from the printed cells of its row is within
 * the tolerance. A column has one count of decimals; the one whose rounding weighs most gets one more at a time.
 */
export function fitColumns<K extends string>(
  rows: readonly Row<K>[],
  start: Readonly<Record<K, number>>,
  rules: readonly ColumnRule<K>[],
): Record<K, number> {
  const decimals: Record<K, number> = { ...start };
  const given = () => rules.reduce((t, r) => r.from.reduce((sum, k) => sum + decimals[k], t), 0);
  let before: number;
  do {
    // A figure that one row gets is printed in all, so rows looked over before are looked over again.
    before = given();
    for (const rule of rules) {
      for (const row of rows) fitRow(row, rule, decimals);
    }
  } while (given() !== before);
  return decimals;
}

function fitRow<K extends string>(row: Row<K>, rule: ColumnRule<K>, decimals: Record<K, number>): void {
  const target = row[rule.column];
  if (target === undefined || rule.from.some((k) => row[k] === undefined)) return;
  const full = row as Readonly<Record<K, number>>;
  const printed: Record<K, number> = { ...full };
  /** The cell worked from what is printed of its row, one column left at full precision if so asked. */
  const print = (exact?: K) => {
    for (const k of rule.from) printed[k] = k === exact ? full[k] : roundTo(full[k], decimals[k]);
    return rule.work(printed);
  };
  const unit = 10 ** -decimals[rule.column];
  const shown = roundTo(target, decimals[rule.column]);
  // Written so that a figure too coarse to work with at all (0/0) counts as a miss.
  for (;;) {
    const worked = print();
    if (Math.abs(worked - shown) <= reworkTolerance * unit) return;
    if (Number.isNaN(worked)) {
      const open = rule.from.filter((k) => decimals[k] < most);
      if (open.length === 0) return;
      for (const k of open) decimals[k] += 1;
      continue;
    }
    const effects = rule.from
      .filter((k) => decimals[k] < most)
      .map((k) => ({ k, effect: Math.abs(print(k) - worked) }));
    const worst = effects.reduce(
      (a, b) => (b.effect > a.effect ? b : a),
      effects[0] ?? { k: rule.column, effect: 0 },
    );
    if (worst.effect === 0) return;
    decimals[worst.k] += 1;
  }
}

/** Decimals of the rows of a sum: one more than the total has, when the printed rows would miss it by over a unit. */
export function fitTerms(terms: readonly number[], totalDecimals: number): number {
  let decimals = totalDecimals;
  const total = roundTo(
    terms.reduce((a, b) => a + b, 0),
    totalDecimals,
  );
  const added = () => terms.reduce((sum, t) => sum + roundTo(t, decimals), 0);
  while (decimals < most && Math.abs(added() - total) > reworkTolerance * 10 ** -totalDecimals) decimals += 1;
  return decimals;
}
