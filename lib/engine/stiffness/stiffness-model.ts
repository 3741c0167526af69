import type { Analysis } from '@/lib/model/analysis';
import { deformationRow, dot, type Element, type EndTriple, elementOf, times } from './element';
import { type Numbering, numberUnknowns } from './number-unknowns';
import { SymmetricSystem } from './symmetric-system';

/** Members, unknowns and equations of a structure, ready for right sides. */
export interface StiffnessModel {
  elements: Element[];
  numbering: Numbering;
  system: SymmetricSystem;
}

/** Undefined when the releases of a member leave it loose in itself. */
export function stiffnessModel(analysis: Analysis): StiffnessModel | undefined {
  const elements = elementsOf(analysis);
  if (!elements) return undefined;
  const numbering = numberUnknowns(analysis, elements);
  return { elements, numbering, system: assemble(elements, numbering) };
}

function elementsOf(analysis: Analysis): Element[] | undefined {
  const place = new Map(analysis.joints.map((j, i) => [j.id, i]));
  const elements = analysis.members.map((m) => {
    const [a, b] = [place.get(m.start), place.get(m.end)];
    const [p, q] = [analysis.joints[a ?? -1], analysis.joints[b ?? -1]];
    if (a === undefined || b === undefined || !p || !q) throw new Error(`member ${m.id} has no joint`);
    return elementOf(m, [a, b], p, q);
  });
  return elements.every((e) => e !== undefined) ? elements : undefined;
}

/** Unknowns of the six end displacements; absent where a joint has no turning. */
export function placesOf(e: Element, { joints }: Numbering): (number | undefined)[] {
  return e.joints.flatMap((j) => [joints[j]?.x, joints[j]?.y, joints[j]?.turn]);
}

/** −F f + B d = e for the members, Bᵀ f − R = P for the joints, −d − R/k = −Δ at the supports. */
function assemble(elements: readonly Element[], numbering: Numbering): SymmetricSystem {
  const system = new SymmetricSystem(naturalSizes(elements, numbering));
  elements.forEach((e, i) => {
    const unknowns = numbering.modes[i] as number[];
    const places = placesOf(e, numbering);
    e.modes.forEach((mode, m) => {
      const row = unknowns[m] as number;
      deformationRow(e, mode).forEach((v, k) => {
        const place = places[k];
        if (place !== undefined) system.add(row, place, v);
      });
      const deformed = times(e.flexibility, mode);
      for (let other = m; other < e.modes.length; other++) {
        system.add(row, unknowns[other] as number, -dot(e.modes[other] as EndTriple, deformed));
      }
    });
  });
  numbering.reactions.forEach((list, j) => {
    const { x, y, turn } = numbering.joints[j] as Numbering['joints'][number];
    for (const { index, axis, spring } of list) {
      [x, y, turn].forEach((place, k) => {
        if (place !== undefined) system.add(index, place, -(axis[k] as number));
      });
      if (spring !== undefined) system.add(index, index, -1 / spring);
    }
  });
  return system;
}

/**
 * Forces and displacements in units of the structure's own, so that flexibility weighs as much as geometry: a mean length,
 * and the displacement that a unit force causes on a mean member.
 */
function naturalSizes(elements: readonly Element[], numbering: Numbering): Float64Array {
  const mean = (of: (e: Element) => number) =>
    Math.exp(elements.reduce((t, e) => t + Math.log(of(e)), 0) / elements.length);
  const length = mean((e) => e.L);
  const give = Math.sqrt(mean((e) => e.flexibility[1][1]) * length ** 2);
  const sizes = new Float64Array(numbering.count).fill(1 / give);
  elements.forEach((e, i) => {
    e.modes.forEach((mode, m) => {
      if (mode[0] === 0) sizes[(numbering.modes[i] as number[])[m] as number] = length / give;
    });
  });
  for (const { x, y, turn } of numbering.joints) {
    sizes[x] = give;
    sizes[y] = give;
    if (turn !== undefined) sizes[turn] = give / length;
  }
  for (const list of numbering.reactions) {
    for (const { component, index } of list) if (component === 'turn') sizes[index] = length / give;
  }
  return sizes;
}
