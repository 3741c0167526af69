import { expect, test } from 'vitest';
import { memberDisplacements } from '@/lib/engine/diagrams/displacements';
import { localLoads, memberAxis } from '@/lib/engine/diagrams/local-loads';
import { loadEndForces, memberForces } from '@/lib/engine/diagrams/member-forces';
import { extremes, valueAt } from '@/lib/engine/diagrams/piecewise';
import { stretches } from '@/lib/engine/diagrams/stretches';
import { type Load, load } from '@/lib/model/load';
import type { Member } from '@/lib/model/structure';

const member: Member = { id: 'AB', start: 'A', end: 'B', EI: 16_000 };
const axis = memberAxis({ id: 'A', x: 0, y: 0 }, { id: 'B', x: 8, y: 0 });
const loads = (...list: object[]): Load[] => list.map((l) => load.parse({ member: 'AB', ...l }));
const still = { along0: 0, across0: 0, across1: 0 };

/** Simple beam, P at a: M = P a b / L, deflection there P a² b² / (3 E I L). AISC Manual Table 3-23, from memory. */
test('a simple beam under a point load jumps in shear and peaks at the load', () => {
  const local = localLoads(loads({ kind: 'point', at: 3, direction: 'y', value: -30 }), member, axis);
  const forces = memberForces({ N: 0, M0: 0, M1: 0 }, local, 8);
  expect(valueAt(forces.V, 3, 'left')).toBeCloseTo((30 * 5) / 8, 12);
  expect(valueAt(forces.V, 3, 'right')).toBeCloseTo((-30 * 3) / 8, 12);
  expect(extremes(forces.M).max).toEqual({ s: 3, value: 56.25 });
  const moved = memberDisplacements(forces, stretches(member, 8), local, still, 8);
  expect(valueAt(moved.across, 3)).toBeCloseTo(-9 / 512, 14);
  expect(valueAt(moved.across, 8)).toBeCloseTo(0, 14);
});

/** A counter-clockwise couple C on a simple beam: both reactions C/L, up at the left, so V = C/L throughout. */
test('a counter-clockwise couple lowers the moment by itself', () => {
  const local = localLoads(loads({ kind: 'couple', at: 2, value: 40 }), member, axis);
  const { V, M } = memberForces({ N: 0, M0: 0, M1: 0 }, local, 8);
  expect(valueAt(V, 5)).toBeCloseTo(5, 12);
  expect(valueAt(M, 2, 'left')).toBeCloseTo(10, 12);
  expect(valueAt(M, 2, 'right')).toBeCloseTo(-30, 12);
});

/** Snow per plan length on a rafter: w cos² across and w cos sin along, per length of rafter. */
test('a load per plan length falls across and along an inclined member', () => {
  const slope = memberAxis({ id: 'A', x: 0, y: 0 }, { id: 'B', x: 8, y: 6 });
  const snow = loads({ kind: 'distributed', direction: 'y', per: 'projection', w1: -12, w2: -12 });
  const [w] = localLoads(snow, member, slope).spread;
  expect(w?.across[0]).toBeCloseTo(-12 * 0.8 * 0.8, 12);
  expect(w?.along[0]).toBeCloseTo(-12 * 0.8 * 0.6, 12);
  const wind = loads({ kind: 'distributed', direction: 'x', per: 'projection', w1: 5, w2: 5 });
  const total = localLoads(wind, member, slope).spread[0];
  const pushed = 10 * ((total?.along[0] as number) * 0.8 - (total?.across[0] as number) * 0.6);
  expect(pushed).toBeCloseTo(5 * 6, 12);
});

test('end forces of a loaded member balance its load', () => {
  const slope = memberAxis({ id: 'A', x: 0, y: 0 }, { id: 'B', x: 3, y: 4 });
  const local = localLoads(
    loads({ kind: 'distributed', direction: 'y', from: 1, to: 4, w1: -2, w2: -8 }),
    member,
    slope,
  );
  const { V0, V1, N1 } = loadEndForces(local, slope.L);
  const [up, along] = [-(15 * 3) / 5, -(15 * 4) / 5];
  expect(V1 - V0).toBeCloseTo(up, 12);
  expect(N1).toBeCloseTo(-along, 12);
});

/** Cantilever, gradient κ: tip κL²/2; rise: αTL; misfit spread over the length. */
test('temperature and lack of fit move a free member without force', () => {
  const warm: Member = { ...member, alpha: 12e-6, depth: 0.3 };
  const local = localLoads(
    loads({ kind: 'temperature', rise: 10, difference: -30 }, { kind: 'misfit', value: 0.004 }),
    warm,
    axis,
  );
  const forces = memberForces({ N: 0, M0: 0, M1: 0 }, local, 8);
  const ends = { along0: 0, across0: 0, rotation0: 0 };
  const moved = memberDisplacements(forces, stretches(warm, 8), local, ends, 8);
  const kappa = (12e-6 * 30) / 0.3;
  expect(valueAt(moved.across, 8)).toBeCloseTo((kappa * 64) / 2, 12);
  expect(valueAt(moved.along, 8)).toBeCloseTo(12e-6 * 10 * 8 + 0.004, 12);
});

/** Cantilever, uniform load, with shear: w L⁴/(8EI) + w L²/(2GAs). Timoshenko's beam; from memory. */
test('shear adds its own deflection, also when the far end is the known one', () => {
  const soft: Member = { ...member, GAs: 5_000 };
  const local = localLoads(loads({ kind: 'distributed', direction: 'y', w1: -10, w2: -10 }), soft, axis);
  const forces = memberForces({ N: 0, M0: -320, M1: 0 }, local, 8);
  const tip = -((10 * 8 ** 4) / (8 * 16_000) + (10 * 64) / (2 * 5_000));
  const own = stretches(soft, 8);
  const fromStart = memberDisplacements(forces, own, local, { along0: 0, across0: 0, rotation0: 0 }, 8);
  expect(valueAt(fromStart.across, 8)).toBeCloseTo(tip, 12);
  const turn = valueAt(fromStart.rotation, 8);
  const fromEnd = memberDisplacements(forces, own, local, { along1: 0, across1: tip, rotation1: turn }, 8);
  expect(valueAt(fromEnd.across, 0)).toBeCloseTo(0, 12);
  expect(valueAt(fromEnd.rotation, 0)).toBeCloseTo(0, 14);
});

/** Cantilever, tip load, EI doubled over the half next to the wall: PL³/(3EI) · (1/8 + 7/16). */
test('a step of stiffness bends each length by its own EI', () => {
  const stepped: Member = { ...member, EI: 32_000, steps: [{ from: 4, EI: 16_000 }] };
  const local = localLoads([], stepped, axis);
  const forces = memberForces({ N: 0, M0: -8 * 5, M1: 0 }, local, 8);
  const moved = memberDisplacements(
    forces,
    stretches(stepped, 8),
    local,
    { along0: 0, across0: 0, rotation0: 0 },
    8,
  );
  const whole = (-5 * 8 ** 3) / (3 * 16_000);
  expect(valueAt(moved.across, 8)).toBeCloseTo(whole * (1 / 8 + (1 - 1 / 8) / 2), 13);
});
