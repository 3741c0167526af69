import type { Determinacy } from '../solution';
import { type Context, pureValue } from './context';
import { dimensions } from './dimensions';
import { type Expression, negative, number, product, sum } from './expression';
import { type Relation, relate } from './relation';

/** Step 3: how many forces equilibrium leaves open. */
export interface DegreeStep {
  kind: 'degree';
  determinacy: Determinacy;
  /** r = 3m + c − n − 3j */
  count: Relation;
  /** Closed rings of members, and hinges and other releases: the short count. */
  rings: number;
}

export function deriveDegree(ctx: Context): DegreeStep {
  const d = ctx.solution.determinacy;
  const whole = (letter: string, value: number) => pureValue(value, 0, { letter });
  const terms: Expression[] = [product(number(3), whole('m', d.members)), whole('c', d.reactions)];
  if (d.releases > 0) terms.push(negative(whole('n', d.releases)));
  terms.push(negative(product(number(3), whole('j', d.joints))));
  const value = 3 * d.members + d.reactions - d.releases - 3 * d.joints;
  const count = relate({ letter: 'r' }, sum(...terms), { dimension: dimensions.pure, decimals: 0 }, value);
  return { kind: 'degree', determinacy: d, count, rings: d.members - d.joints + partsOf(ctx) };
}

/** Connected parts of the structure, its supports left aside. */
function partsOf({ analysis }: Context): number {
  const root = new Map(analysis.joints.map((j) => [j.id, j.id]));
  const find = (id: string): string => {
    const up = root.get(id);
    return up === undefined || up === id ? id : find(up);
  };
  for (const m of analysis.members) root.set(find(m.start), find(m.end));
  return new Set(analysis.joints.map((j) => find(j.id))).size;
}
