import type { Analysis } from '@/lib/model/analysis';
import type { Place, Refusal } from '@/lib/model/refusal';
import { faultOfLoad, partsOf } from './fault-of-load';

const refuse = (code: string, message: string, place: Place): Refusal => ({ code, message, place });

/** Names of cases and combinations, and whether every load has something to act on. */
export function validateLoads(analysis: Analysis): Refusal | undefined {
  const ids = new Set<string>();
  const parts = partsOf(analysis);
  for (const [k, c] of analysis.cases.entries()) {
    if (ids.has(c.id))
      return refuse('duplicate-case', `There are two cases ${c.id}.`, { path: `cases.${k}`, case: c.id });
    ids.add(c.id);
    for (const [i, load] of c.loads.entries()) {
      const place = { path: `cases.${k}.loads.${i}`, case: c.id, load: i };
      const fault = faultOfLoad(load, parts);
      if (fault) return refuse(fault.code, fault.message, { ...place, ...fault.place });
    }
  }
  const names = new Set<string>();
  for (const [i, combination] of analysis.combinations.entries()) {
    const path = `combinations.${i}`;
    if (names.has(combination.id))
      return refuse('duplicate-combination', `There are two combinations ${combination.id}.`, { path });
    names.add(combination.id);
    const missing = Object.keys(combination.factors).find((id) => !ids.has(id));
    if (missing !== undefined)
      return refuse(
        'unknown-case',
        `Combination ${combination.id} names case ${missing}, which does not exist.`,
        { path },
      );
  }
  return undefined;
}
