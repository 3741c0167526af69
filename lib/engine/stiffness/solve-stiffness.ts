import type { Analysis } from '@/lib/model/analysis';
import { BandedSystem } from './banded';
import { type BeamElement, beamElement, elementLoad } from './beam-element';
import { numberUnknowns } from './number-unknowns';

export interface StiffnessCase {
  /** "A:x" → value, in the support's own axes. */
  reactions: Map<string, number>;
  members: { N: number; M0: number; M1: number }[];
  joints: { x: number; y: number; rotation: number }[];
}

/** Below this part of its row a pivot of the stiffness matrix means that nothing holds that movement. */
const pivotTolerance = 1e-13;

/**
 * The independent second way: displacements of the joints (and the axial force of every member, so that a member that
 * does not stretch is a constraint and not a large number) from equilibrium of the joints. In multiples of EI0, so that
 * displacements of a relative sheet are EI0 times the true ones. Undefined when the structure moves freely.
 */
export function solveStiffness(analysis: Analysis, unit: number): Map<string, StiffnessCase> | undefined {
  const place = new Map(analysis.joints.map((j, i) => [j.id, i]));
  const elements = analysis.members.map((m) => {
    const [a, b] = [place.get(m.start) as number, place.get(m.end) as number];
    const [p, q] = [analysis.joints[a], analysis.joints[b]];
    if (!p || !q) throw new Error(`member ${m.id} has no joint`);
    const L = Math.hypot(q.x - p.x, q.y - p.y);
    return { m, a, b, e: beamElement(m, L, (q.x - p.x) / L, (q.y - p.y) / L) };
  });
  const numbers = numberUnknowns(analysis, elements);
  const system = new BandedSystem(numbers.count);
  const rights = analysis.cases.map(() => new Float64Array(numbers.count));
  const put = (k: number, i: number | undefined, v: number) => {
    const right = rights[k];
    if (i !== undefined && right) right[i] = (right[i] as number) + v;
  };
  const loads = elements.map(({ m, e }) => analysis.cases.map((c) => elementLoad(m, e, c.loads)));
  const typical = typicalStiffness(elements.map((x) => x.e));
  elements.forEach(({ e, a, b }, n) => {
    const d = [a, b].flatMap((j) => [numbers.joint(j, 0), numbers.joint(j, 1), numbers.joint(j, 2)]);
    const B = deformationRows(e);
    const K = momentStiffness(e);
    const rows = [B[0] as number[], B[1] as number[]];
    for (let i = 0; i < 6; i++) {
      for (let j = 0; j < 6; j++) {
        let value = 0;
        for (let p = 0; p < 2; p++)
          for (let q = 0; q < 2; q++)
            value += (rows[p]?.[i] as number) * (K[p]?.[q] as number) * (rows[q]?.[j] as number);
        if (value !== 0) system.add(d[i] as number, d[j] as number, value);
      }
    }
    const nUnknown = numbers.axial(n);
    if (nUnknown !== undefined) {
      const g = [-e.c, -e.s, 0, e.c, e.s, 0];
      g.forEach((v, i) => {
        if (v === 0) return;
        system.add(d[i] as number, nUnknown, v * typical);
        system.add(nUnknown, d[i] as number, v * typical);
      });
      system.add(nUnknown, nUnknown, -e.stretch * typical * typical);
    }
    (loads[n] ?? []).forEach((l, k) => {
      const M = loadMoments(e, K, l.rotation, l.M);
      rows.forEach((row, p) => {
        row.forEach((v, i) => {
          put(k, d[i], -v * (M[p] as number));
        });
      });
      [
        l.V0 * e.s + l.N0 * e.c,
        -l.V0 * e.c + l.N0 * e.s,
        0,
        -l.V1 * e.s - (l.N0 - l.along) * e.c,
        l.V1 * e.c - (l.N0 - l.along) * e.s,
        0,
      ].forEach((v, i) => {
        put(k, d[i], v);
      });
      put(k, nUnknown, l.elongation * typical);
    });
  });
  analysis.joints.forEach((joint, j) => {
    analysis.cases.forEach((c, k) => {
      for (const load of c.loads) {
        if (load.kind !== 'joint' || load.joint !== joint.id) continue;
        put(k, numbers.joint(j, 0), load.x);
        put(k, numbers.joint(j, 1), load.y);
        put(k, numbers.joint(j, 2), load.couple);
      }
    });
    numbers.reactions(j).forEach(({ component, index, axis, spring }) => {
      axis.forEach((v, i) => {
        if (v === 0) return;
        system.add(numbers.joint(j, i), index, -v * typical);
        system.add(index, numbers.joint(j, i), -v * typical);
      });
      system.add(index, index, spring === undefined ? 0 : -(typical * typical) / spring);
      analysis.cases.forEach((c, k) => {
        for (const load of c.loads)
          if (load.kind === 'settlement' && load.joint === joint.id && load.component === component)
            put(k, index, -load.value * typical);
      });
    });
  });
  const spare = numbers.unused();
  for (const i of spare) system.add(i, i, typical);
  const solved = system.solve(rights, pivotTolerance * Math.min(1, unit));
  if (!solved) return undefined;
  return new Map(
    analysis.cases.map((c, k) => {
      const x = solved[k] as Float64Array;
      const at = (i: number) => x[i] as number;
      const members = elements.map(({ e, a, b }, n) => {
        const d = [a, b].flatMap((j) => [0, 1, 2].map((i) => at(numbers.joint(j, i))));
        const B = deformationRows(e);
        const K = momentStiffness(e);
        const l = loads[n]?.[k];
        if (!l) throw new Error('a member without its loads');
        const phi = B.map((row) => row.reduce((t, v, i) => t + v * (d[i] as number), 0));
        const M = loadMoments(e, K, l.rotation, l.M);
        const end = (p: number) =>
          (K[p] as number[]).reduce((t, v, q) => t + v * (phi[q] as number), M[p] as number);
        const nUnknown = numbers.axial(n);
        return { N: nUnknown === undefined ? l.N0 : at(nUnknown) * typical, M0: end(0), M1: end(1) };
      });
      const reactions = new Map<string, number>();
      analysis.joints.forEach((joint, j) => {
        for (const r of numbers.reactions(j))
          reactions.set(`${joint.id}:${r.component}`, at(r.index) * typical);
      });
      const joints = analysis.joints.map((_, j) => ({
        x: at(numbers.joint(j, 0)),
        y: at(numbers.joint(j, 1)),
        rotation: at(numbers.joint(j, 2)),
      }));
      return [c.id, { reactions, members, joints }];
    }),
  );
}

/** (ψ − θ0, θ1 − ψ) from the six end displacements. */
function deformationRows({ L, c, s }: BeamElement): number[][] {
  return [
    [s / L, -c / L, -1, -s / L, c / L, 0],
    [-s / L, c / L, 0, s / L, -c / L, 1],
  ];
}

/** modes (modesᵀ F modes)⁻¹ modesᵀ */
function momentStiffness({ F, modes }: BeamElement): number[][] {
  const f = (a: [number, number], b: [number, number]) =>
    a[0] * b[0] * F[0] + (a[0] * b[1] + a[1] * b[0]) * F[1] + a[1] * b[1] * F[2];
  const [p, q] = modes;
  const outer = (a: [number, number], b: [number, number], v: number) => [
    [a[0] * b[0] * v, a[0] * b[1] * v],
    [a[1] * b[0] * v, a[1] * b[1] * v],
  ];
  if (!p)
    return [
      [0, 0],
      [0, 0],
    ];
  if (!q) return outer(p, p, 1 / f(p, p));
  const det = f(p, p) * f(q, q) - f(p, q) ** 2;
  return [
    [f(q, q) / det, -f(p, q) / det],
    [-f(p, q) / det, f(p, p) / det],
  ];
}

/** End moments of the member with its ends held, under its own loads. */
function loadMoments(
  { F }: BeamElement,
  K: number[][],
  rotation: [number, number],
  given: [number, number],
): number[] {
  const e = [
    rotation[0] + F[0] * given[0] + F[1] * given[1],
    rotation[1] + F[1] * given[0] + F[2] * given[1],
  ];
  return [0, 1].map(
    (p) => (given[p] as number) - (K[p] as number[]).reduce((t, v, q) => t + v * (e[q] as number), 0),
  );
}

/** A force per length of the structure's own size, so that constraints weigh as much as stiffness. */
function typicalStiffness(elements: readonly BeamElement[]): number {
  const logs = elements.map((e) => Math.log(1 / (e.F[0] * e.L * e.L)));
  return Math.exp(logs.reduce((a, b) => a + b, 0) / logs.length);
}
