import type { Analysis } from '@/lib/model/analysis';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Solution } from '../solution';
import { chooser, groundOf } from './choose';
import { openForces } from './open-forces';

/** A good set of redundants; the condition is that of its flexibility matrix scaled to a unit diagonal. */
export interface GoodSet {
  quantities: Quantity[];
  condition: number;
}

/** Sets tried for one list; where there would be more, one redundant of the proposed set is exchanged at a time. */
const mostTrials = 400;

/** Good sets of redundants, best conditioned first, the proposed set among them. Empty when nothing is indeterminate. */
export function listChoices(analysis: Analysis, most = 40): GoodSet[] {
  const ground = groundOf(analysis);
  if ('good' in ground || ground.proposed.redundants.length === 0) return [];
  const { eq, proposed } = ground;
  const name = (column: number) => eq.quantities[column] as Quantity;
  const candidates = openForces(eq, proposed).map((group) => group[0] as number);
  const n = proposed.redundants.length;
  const all = numberOfSubsets(candidates.length, n) <= mostTrials;
  const sets = all ? subsets(candidates, n) : exchanges(proposed.redundants, candidates);
  const ask = chooser(analysis);
  const tried = [proposed.redundants, ...sets].slice(0, mostTrials).flatMap((set): GoodSet[] => {
    const quantities = set.map(name);
    const choice = ask(quantities);
    return choice.good ? [{ quantities, condition: choice.condition }] : [];
  });
  const seen = new Set<string>();
  return tried
    .filter(({ quantities }) => {
      const key = quantities.map(quantityKey).sort().join();
      return !seen.has(key) && seen.add(key);
    })
    .sort((a, b) => a.condition - b.condition)
    .slice(0, most);
}

/** Every force that may be a redundant, each once, those of the solution first. */
export function proposedChoices(solution: Solution): Quantity[] {
  const ground = groundOf(solution.analysis);
  if ('good' in ground) return solution.redundants;
  const { eq, proposed } = ground;
  const chosen = new Set(solution.redundants.map((q) => eq.indexOf.get(quantityKey(q)) as number));
  const others = openForces(eq, proposed).flatMap((group) =>
    group.some((q) => chosen.has(q)) ? [] : [eq.quantities[group[0] as number] as Quantity],
  );
  return [...solution.redundants, ...others];
}

function subsets(items: readonly number[], n: number): number[][] {
  if (n === 0) return [[]];
  return items.flatMap((first, i) => subsets(items.slice(i + 1), n - 1).map((rest) => [first, ...rest]));
}

function numberOfSubsets(of: number, n: number): number {
  let count = 1;
  for (let i = 0; i < n; i++) count = (count * (of - i)) / (i + 1);
  return count;
}

function exchanges(set: readonly number[], candidates: readonly number[]): number[][] {
  const others = candidates.filter((q) => !set.includes(q));
  return set.flatMap((_, i) => others.map((other) => set.map((q, k) => (k === i ? other : q))));
}
