import type { Load, LoadCase } from '@/lib/model/load';
import { addDistributed, pen } from './add-distributed';
import { addMemberNote, addSettlement } from './add-movements';
import { addCouple, addJointLoad, addPointLoad } from './add-point-loads';
import type { Prepared } from './draw-structure';
import type { Sheet } from './fit-drawing';
import { goingOn } from './load-runs';
import { magnitude } from './magnitude';
import { LoadStack } from './stack-loads';
import { beyond, dot } from './vector';

/** Every load of a case at its place, with its value. Forces at joints come last: they stand above what is there. */
export function addLoads(sheet: Sheet, ready: Prepared, { id, loads }: LoadCase): void {
  const stack = new LoadStack();
  const greatest = Math.max(
    ...loads.map((l) => (l.kind === 'distributed' ? Math.max(Math.abs(l.w1), Math.abs(l.w2)) : 0)),
    Number.MIN_VALUE,
  );
  const lengths = [...ready.axes.values()].map((axis) => axis.length).toSorted((a, b) => a - b);
  const usual = (lengths[Math.floor(lengths.length / 2)] ?? 0) * sheet.view.perUnit;
  const tallest = Math.min(24, Math.max(9, 0.4 * usual));
  const muted = goingOn(ready, loads);
  for (const kinds of order) {
    loads.forEach((load, i) => {
      if (!kinds.includes(load.kind)) return;
      const look = {
        greatest,
        tallest,
        stack,
        ref: { of: 'load', id: `${id}:${i}` },
        mute: muted.has(i),
      } as const;
      addLoad(sheet, ready, load, look);
    });
  }
}

const order: Load['kind'][][] = [
  ['distributed', 'self-weight'],
  ['point', 'couple', 'temperature', 'misfit', 'settlement'],
  ['joint'],
];

interface Look {
  greatest: number;
  tallest: number;
  stack: LoadStack;
  ref: { of: 'load'; id: string };
  mute: boolean;
}

function addLoad(sheet: Sheet, { frame, axes, signs }: Prepared, load: Load, look: Look): void {
  const axis = 'member' in load ? axes.get(load.member) : undefined;
  switch (load.kind) {
    case 'distributed':
      if (axis) addDistributed(sheet, frame, axis, load, look);
      break;
    case 'point':
      if (axis) addPointLoad(sheet, frame, axis, load, look.stack, look.ref);
      break;
    case 'couple':
      if (axis) addCouple(sheet, sheet.view.at(axis.at(load.at)), load.value, frame, look.ref);
      break;
    case 'temperature':
    case 'misfit':
      if (axis) addMemberNote(sheet, frame, axis, load, look.ref);
      break;
    case 'settlement':
      addSettlement(sheet, frame, signs, load, look.ref);
      break;
    case 'joint':
      addJointLoad(
        sheet,
        frame,
        axes,
        signs,
        load,
        (toward) => standing(load.joint, toward, axes, look),
        look.ref,
      );
      break;
    case 'self-weight':
      addWeights(sheet, { frame, axes, signs }, load.members, look);
      break;
  }
}

/** What stands on the members of a joint towards a side, points. */
function standing(
  joint: string,
  toward: { x: number; y: number },
  axes: Prepared['axes'],
  { stack }: Look,
): number {
  let height = 0;
  for (const { member, left, length } of axes.values()) {
    const s = member.start === joint ? 0 : member.end === joint ? length : undefined;
    if (s === undefined || Math.abs(dot(toward, left)) < 0.5) continue;
    height = Math.max(height, stack.clear(member.id, dot(toward, left) > 0 ? 1 : -1, s, s));
  }
  return height;
}

/** Own weight: a small arrow down at the middle of every member that has one, with its weight per length. */
function addWeights(
  { sketch, view, size }: Sheet,
  { frame, axes }: Prepared,
  only: string[] | undefined,
  look: Look,
): void {
  for (const { member, at, length } of axes.values()) {
    if (member.weight === undefined || (only && !only.includes(member.id))) continue;
    const middle = view.at(at(0.5 * length));
    const tip = beyond(middle, { x: 0, y: 1 }, 17);
    sketch.arrow(beyond(middle, { x: 0, y: 1 }, 4), tip, { ...pen, ref: look.ref }, 5);
    sketch.reserve(beyond(tip, { x: 0, y: 1 }, 1.4 * size));
    sketch.label({
      text: `own weight $${magnitude(member.weight, 'distributed', frame.units)}$`,
      size: size * 0.9,
      tone: 'pen',
      ref: look.ref,
      rank: 1,
      spots: [
        { at: tip, toward: { x: 0, y: 1 }, gap: 2 },
        { at: beyond(middle, { x: 0, y: 1 }, 11), toward: { x: 1, y: 0 }, gap: 5 },
      ],
    });
  }
}
