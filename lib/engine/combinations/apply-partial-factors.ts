import type { LoadCase } from '@/lib/model/load';
import type { PartialFactorSet } from './combination-set';
import { type Arrangements, products, scale, type Variant, variantsOf } from './variants';

type Rule = PartialFactorSet['rules'][number];

/** Natures whose category stands in the ψ table under a name of its own. */
const categoryOfNature: Partial<Record<LoadCase['nature'], string>> = {
  'roof-live': 'H',
  wind: 'wind',
  temperature: 'temperature',
};

const variableNatures = new Set<LoadCase['nature']>(['live', 'roof-live', 'snow', 'wind', 'temperature']);

/** The ψ row of a variable load; undefined where the sheet gives no category that the table knows. */
export function psiOf(set: PartialFactorSet, c: LoadCase): readonly number[] | undefined {
  return variableNatures.has(c.nature) ? set.psi[c.category ?? categoryOfNature[c.nature] ?? ''] : undefined;
}

/**
 * Every sum that an expression of EN 1990 asks for: permanent loads with each of their factors, every variable load
 * leading in turn, the others accompanying with their ψ or, where favourable, not at all.
 */
export function applyPartialFactors(
  set: PartialFactorSet,
  rule: Rule,
  cases: readonly LoadCase[],
  arrangements: Arrangements,
): Variant[] {
  const dead = variantsOf(cases.filter((c) => c.nature === 'dead'));
  const permanent = dead.length === 0 ? [{}] : rule.permanent.flatMap((f) => dead.map((v) => scale(v, f)));
  const actions = actionsOf(set, cases).map(({ psi, cases: mine }) => {
    const acting = variantsOf(mine, arrangements);
    const factored = ({ factor, psi: which }: Rule['leading']) =>
      acting.map((v) => scale(v, which === undefined ? factor : factor * (psi[which] as number)));
    return { leading: factored(rule.leading), accompanying: [...factored(rule.accompanying), {}] };
  });
  const sums = actions.flatMap((lead) =>
    products([permanent, lead.leading, ...actions.filter((a) => a !== lead).map((a) => a.accompanying)]),
  );
  return [...sums, ...permanent].filter((v) => Object.keys(v).length > 0);
}

/** Variable actions: cases of one nature and one ψ row belong together. */
function actionsOf(set: PartialFactorSet, cases: readonly LoadCase[]) {
  const actions = new Map<string, { psi: readonly number[]; cases: LoadCase[] }>();
  for (const c of cases) {
    const psi = psiOf(set, c);
    if (!psi) continue;
    const key = `${c.nature}:${psi.join(':')}`;
    const action = actions.get(key) ?? { psi, cases: [] };
    action.cases.push(c);
    actions.set(key, action);
  }
  return [...actions.values()];
}
