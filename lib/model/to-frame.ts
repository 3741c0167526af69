import { readQuantity } from '@/lib/units/read-quantity';
import { writeQuantity } from '@/lib/units/write-quantity';
import type { Draft, DraftGeometry, DraftJoint, DraftMember, DraftStiffness, DraftSupport } from './draft';
import { blankSupport } from './starting-draft';

/**
 * The same sheet as joints and members. Names, stiffness, supports and loads stay as they were; only positions of a
 * beam's joints are sums of its spans. A length that cannot be read yet is carried as it was typed.
 */
export function toFrame(draft: Draft): Draft {
  const g = draft.geometry;
  switch (g.shape) {
    case 'frame':
      return draft;
    case 'beam':
      return { ...draft, geometry: beamFrame(draft, g) };
    case 'portal':
      return { ...draft, geometry: portalFrame(g) };
  }
}

function beamFrame(draft: Draft, g: Extract<DraftGeometry, { shape: 'beam' }>): DraftGeometry {
  let x: number | undefined = 0;
  const joints: DraftJoint[] = [joint('1', '0', '0', g.supports[0])];
  const members: DraftMember[] = [];
  g.spans.forEach((span, i) => {
    const read = readQuantity(span.length, 'length', draft.units);
    x = x === undefined || !read.ok ? undefined : x + read.value;
    const at = x === undefined ? span.length : writeQuantity(x, 'length', draft.units, 12);
    joints.push(joint(`${i + 2}`, at, '0', g.supports[i + 1]));
    members.push(member(`${i + 1}`, `${i + 2}`, span.stiffness));
  });
  return { shape: 'frame', joints, members };
}

function portalFrame(g: Extract<DraftGeometry, { shape: 'portal' }>): DraftGeometry {
  return {
    shape: 'frame',
    joints: [
      joint('1', '0', '0', g.leftBase),
      joint('2', '0', g.leftHeight),
      joint('3', g.span, g.rightHeight),
      joint('4', g.span, '0', g.rightBase),
    ],
    members: [member('1', '2', g.leftColumn), member('2', '3', g.beam), member('3', '4', g.rightColumn)],
  };
}

function joint(id: string, x: string, y: string, support?: DraftSupport): DraftJoint {
  return { id, x, y, support: support ?? blankSupport('free') };
}

function member(start: string, end: string, stiffness: DraftStiffness): DraftMember {
  return { start, end, startHinge: false, endHinge: false, stiffness };
}
