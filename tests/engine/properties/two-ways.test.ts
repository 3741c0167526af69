import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Solution } from '@/lib/engine/solution';
import { type StiffnessCase, solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { analysis } from '@/lib/model/analysis';
import {
  difference,
  sizeOf,
  solveOrRefuse,
  toleranceOf,
  typicalLength,
  type Values,
  valuesOf,
} from './compare-results';
import { randomBeam, randomGrid, randomTree } from './random-structure';

function stiffnessValues(solution: Solution, c: StiffnessCase): Values {
  const length = typicalLength(solution);
  const forces = new Map<string, number>();
  for (const [key, value] of c.reactions) {
    if (!c.open.has(key)) forces.set(key, key.endsWith(':turn') ? value / length : value);
  }
  solution.analysis.members.forEach(({ id }, i) => {
    const m = c.members[i];
    if (!m) throw new Error('a member without forces');
    if (!c.open.has(id)) forces.set(`${id}:N`, m.N);
    forces.set(`${id}:M0`, m.M0 / length).set(`${id}:M1`, m.M1 / length);
  });
  const motions = new Map<string, number>();
  solution.analysis.joints.forEach(({ id }, j) => {
    const moved = c.joints[j];
    if (!moved) throw new Error('a joint without motion');
    motions.set(`${id}:x`, moved.x).set(`${id}:y`, moved.y);
    if (moved.rotation !== undefined) motions.set(`${id}:rotation`, moved.rotation * length);
  });
  return { forces, motions };
}

test.each([
  ['beams', randomBeam, 500],
  ['trees', randomTree, 400],
  ['grids', randomGrid, 350],
] as const)('the force method and stiffness agree on random %s', (_, structures, numRuns) => {
  let solved = 0;
  fc.assert(
    fc.property(structures, (input) => {
      const solution = solveOrRefuse(input);
      const second = solveStiffness(analysis.parse(input));
      if (!solution) return;
      solved++;
      for (const [id, result] of Object.entries(solution.cases)) {
        const other = second?.get(id);
        if (!other) throw new Error('only the force method found an answer');
        const [a, b] = [valuesOf(solution, result, other.open), stiffnessValues(solution, other)];
        expect(a.forces.size).toBe(b.forces.size);
        const { force, motion } = sizeOf(solution, id);
        expect(difference(a.forces, b.forces, force)).toBeLessThan(toleranceOf(solution));
        expect(difference(a.motions, b.motions, motion)).toBeLessThan(toleranceOf(solution));
      }
    }),
    { numRuns },
  );
  expect(solved).toBeGreaterThan(numRuns / 2);
});
