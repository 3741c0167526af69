import fc from 'fast-check';
import { expect, test } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { limits } from '@/lib/model/analysis';
import { randomStructure } from './random-structure';

/** Every number of an answer, however deep. */
function* numbers(value: unknown): Generator<number> {
  if (typeof value === 'number') yield value;
  else if (value !== null && typeof value === 'object')
    for (const part of Object.values(value)) yield* numbers(part);
}

function expectDecent(input: unknown): void {
  const result = solve(input);
  if (result.ok) {
    for (const n of numbers(result.value)) if (!Number.isFinite(n)) throw new Error(`an answer holds ${n}`);
    return;
  }
  expect(result.refusal.code).toMatch(/^[a-zA-Z0-9-]+$/);
  expect(result.refusal.message.length).toBeGreaterThan(10);
}

test('anything at all is answered or refused, never thrown', () => {
  fc.assert(
    fc.property(fc.anything(), (input) => expectDecent(input)),
    { numRuns: 1_000 },
  );
});

const strange = fc.constantFrom<unknown>(
  0,
  -0,
  -1,
  1e-300,
  1e300,
  1e-12,
  1e12,
  Number.MAX_VALUE,
  Number.MIN_VALUE,
  Number.NaN,
  Number.POSITIVE_INFINITY,
  '',
  '0',
  'nothing',
  null,
  undefined,
  true,
  [],
  {},
  '__proto__',
  'constructor',
);

/** Replaces one leaf of a good form by something strange. */
function spoil(value: unknown, path: number[], by: unknown): unknown {
  if (value === null || typeof value !== 'object') return by;
  const keys = Object.keys(value);
  const [first, ...rest] = path;
  const key = keys[(first ?? 0) % Math.max(keys.length, 1)];
  if (key === undefined || first === undefined) return by;
  const copy: Record<string, unknown> | unknown[] = Array.isArray(value) ? [...value] : { ...value };
  Reflect.set(copy, key, spoil(Reflect.get(value, key), rest, by));
  return copy;
}

test('a good form with one place spoiled is answered or refused, never thrown', () => {
  fc.assert(
    fc.property(
      randomStructure,
      fc.array(fc.nat(50), { minLength: 1, maxLength: 6 }),
      strange,
      (input, path, by) => expectDecent(spoil(input, path, by)),
    ),
    { numRuns: 800 },
  );
});

test('a structure beyond the limits is refused at once, with the limit', () => {
  const count = limits.joints + 1;
  const result = solve({
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'absolute' },
    joints: Array.from({ length: count }, (_, i) => ({ id: `${i}`, x: i, y: 0 })),
    members: Array.from({ length: count - 1 }, (_, i) => ({
      id: `m${i}`,
      start: `${i}`,
      end: `${i + 1}`,
      EI: 1,
    })),
    cases: [],
  });
  expect(result.ok).toBe(false);
  if (!result.ok) expect(result.refusal.message).toContain(`${limits.joints}`);
});
