import type { LoadCase } from '@/lib/model/load';
import type { SumSet, Term } from './combination-set';
import { type Arrangements, products, scale, type Variant, variantsOf } from './variants';

type Rule = SumSet['rules'][number];

/** Every sum that a rule asks for: companions act or do not, alternatives one at a time. */
export function applySums(rule: Rule, cases: readonly LoadCase[], arrangements: Arrangements): Variant[] {
  const lists: Variant[][] = [];
  for (const entry of rule.terms) {
    const terms = 'one' in entry ? entry.one : [entry];
    const acting = terms.flatMap((t) => actingOf(t, cases, arrangements));
    if (entry.principal && acting.length === 0) return [];
    const kept = entry.principal || ('always' in entry && entry.always && acting.length > 0);
    lists.push(kept ? acting : [...acting, {}]);
  }
  return products(lists).filter((v) => Object.keys(v).length > 0);
}

function actingOf(term: Term, cases: readonly LoadCase[], arrangements: Arrangements): Variant[] {
  const mine = cases.filter((c) => {
    if (c.nature !== term.of) return false;
    return term.category === undefined || (c.category === 'vertical') === (term.category === 'vertical');
  });
  return variantsOf(mine, arrangements).map((v) => scale(v, term.factor));
}

export function coversBySums(set: SumSet, c: LoadCase): boolean {
  const terms = set.rules.flatMap((r) => r.terms.flatMap((t): Term[] => ('one' in t ? t.one : [t])));
  return terms.some((t) => t.of === c.nature);
}
