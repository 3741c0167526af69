import { type Combination, longestName } from '@/lib/model/analysis';
import { freeName } from '@/lib/model/free-name';
import type { LoadCase } from '@/lib/model/load';
import { applyPartialFactors, psiOf } from './apply-partial-factors';
import { applySums, coversBySums } from './apply-sums';
import type { CombinationSet } from './combination-set';
import type { Arrangements, Variant } from './variants';

/**
 * The combinations that a published set asks for, given the cases of a sheet: each rule with every acting sign of
 * reversible loads, every alternative (Lr or S or R), and with companions left out, since a load that does not act may
 * govern. Sums that come out alike stand once, under the first rule that asks for them. Named by their own sum
 * ("1.2D+1.6L") or, where that is too long, by rule and number. `arrangements` are sets of live cases that act together
 * (see patternCases).
 */
export function combine(
  cases: readonly LoadCase[],
  set: CombinationSet,
  arrangements: Arrangements = [],
): Combination[] {
  const found = new Map<string, Combination>();
  const names = new Set<string>();
  for (const { rule, variants } of applyRules(set, cases, arrangements)) {
    let number = 0;
    for (const variant of variants) {
      const factors = tidy(cases, variant);
      const key = `${rule.purpose} ${JSON.stringify(factors)}`;
      if (Object.keys(factors).length === 0 || found.has(key)) continue;
      number++;
      const sum = writeSum(factors);
      const prefix = rule.purpose === 'service' && names.has(sum) ? 'service ' : '';
      const name = `${prefix}${sum}`;
      const id = freeName(name.length <= longestName ? name : `${rule.id}-${number}`, names, longestName);
      names.add(id);
      found.set(key, {
        id,
        purpose: rule.purpose,
        factors,
        source: `${rule.source}, ${rule.evidence}`,
      });
    }
  }
  return [...found.values()];
}

/** Cases that no combination of the set can hold, each with the reason: the office has to add sums of its own. */
export function leftOut(cases: readonly LoadCase[], set: CombinationSet): { case: string; reason: string }[] {
  return cases.flatMap((c) => {
    if (set.kind === 'sums') {
      return coversBySums(set, c)
        ? []
        : [{ case: c.id, reason: `${set.title} as held here has no ${c.nature} load.` }];
    }
    if (c.nature === 'dead' || psiOf(set, c)) return [];
    const reason =
      c.nature === 'live' || c.nature === 'snow'
        ? `Case ${c.id} needs its category for ψ.`
        : `${set.title} as held here has no ${c.nature} load.`;
    return [{ case: c.id, reason }];
  });
}

function applyRules(set: CombinationSet, cases: readonly LoadCase[], arrangements: Arrangements) {
  return set.kind === 'sums'
    ? set.rules.map((rule) => ({ rule, variants: applySums(rule, cases, arrangements) }))
    : set.rules.map((rule) => ({ rule, variants: applyPartialFactors(set, rule, cases, arrangements) }));
}

/** Factors in the order of the cases, without those that are zero, free of the rounding of products. */
function tidy(cases: readonly LoadCase[], variant: Variant): Record<string, number> {
  const entries = cases.flatMap((c): [string, number][] => {
    const factor = variant[c.id];
    return factor === undefined || factor === 0 ? [] : [[c.id, Number(factor.toPrecision(12))]];
  });
  return Object.fromEntries(entries);
}

/** "1.2D+1.6L−W" */
export function writeSum(factors: Readonly<Record<string, number>>): string {
  return Object.entries(factors)
    .map(([id, f], i) => {
      const sign = f < 0 ? '−' : i === 0 ? '' : '+';
      return `${sign}${Math.abs(f) === 1 ? '' : Math.abs(f)}${id}`;
    })
    .join('');
}
