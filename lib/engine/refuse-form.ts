import { limits } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';

/** Loads of all cases together; beyond it an answer would keep a person waiting. */
const mostLoads = 20_000;

/**
 * Sizes that can be seen without reading the form, so that an oversized one is refused at once. Anything that is not
 * the form at all is left to the schema.
 */
export function refuseForm(input: unknown): Refusal | undefined {
  if (typeof input !== 'object' || input === null) return undefined;
  for (const name of ['joints', 'members', 'cases', 'combinations'] as const) {
    const n = lengthOf(Reflect.get(input, name));
    if (n > limits[name])
      return tooLarge(
        `There are ${n} ${name}; up to ${limits[name]} are solved here. Divide the structure.`,
        name,
      );
  }
  const cases: unknown = Reflect.get(input, 'cases');
  if (!Array.isArray(cases)) return undefined;
  const loads = cases.reduce(
    (n: number, c: unknown) =>
      n + (typeof c === 'object' && c !== null ? lengthOf(Reflect.get(c, 'loads')) : 0),
    0,
  );
  return loads > mostLoads
    ? tooLarge(`There are ${loads} loads; up to ${mostLoads} are solved here. Divide the structure.`, 'cases')
    : undefined;
}

const lengthOf = (list: unknown) => (Array.isArray(list) ? list.length : 0);

function tooLarge(message: string, path: string): Refusal {
  return { code: 'too-large', message, place: { path } };
}
