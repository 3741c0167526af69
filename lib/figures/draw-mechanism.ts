import type { Quantity } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import { addActionLines } from './add-action-lines';
import { addTurnArrow } from './add-arrows';
import { addJointNames } from './add-joint-names';
import { addReleases } from './add-members';
import { addSupports } from './add-supports';
import { list, say } from './describe-structure';
import { prepare } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing, type Sheet } from './fit-drawing';
import type { Frame, MemberAxis } from './member-axis';
import { releaseQuantities } from './release-quantities';
import type { Style } from './sketch';
import { add, beyond, size as lengthOf, mix, type Point, scale, subtract, unit } from './vector';

export interface MechanismOptions extends DrawOptions {
  /** How far along its motion it is drawn, 0 to 1, for a screen that moves it. The frame of the drawing stays. */
  share?: number;
}

type Piece = Mechanism['pieces'][number];

const ochre: Style = { stroke: 'ochre', width: 1.9 };
const thin: Style = { stroke: 'ochre', width: 0.9 };

/**
 * How an unstable structure moves: at rest in pale lines, displaced in ochre (x − φy, y + φx about each centre, as small
 * displacements are), with the lines of action of what still holds it.
 */
export function drawMechanism(
  frame: Frame,
  released: readonly Quantity[],
  mechanism: Mechanism,
  options: MechanismOptions,
): Drawing {
  const left = releaseQuantities(frame, released);
  const ready = prepare(left);
  const greatest = Math.max(...Object.values(mechanism.joints).map(lengthOf), 1e-12);
  const alt = `Mechanism: ${list(mechanism.pieces.map(pieceInWords))}.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    const { sketch, view } = sheet;
    const factor = (2.6 * sheet.size) / (greatest * view.perUnit);
    const place = (id: string, share: number): Point => {
      const joint = left.joints.find((j) => j.id === id);
      if (!joint) throw new Error(`there is no joint ${id}`);
      return view.at(beyond(joint, mechanism.joints[id] ?? { x: 0, y: 0 }, factor * share));
    };
    addActionLines(sheet, ready, mechanism);
    for (const { start, end } of ready.axes.values()) {
      sketch.line(view.at(start), view.at(end), { stroke: 'ink3', width: 0.8 });
    }
    addSupports(sheet, left, ready.signs);
    for (const { member } of ready.axes.values()) {
      const ref = { of: 'member', id: member.id } as const;
      sketch.line(place(member.start, options.share ?? 1), place(member.end, options.share ?? 1), {
        ...ochre,
        ref,
      });
    }
    for (const { id } of left.joints) {
      const [from, to] = [place(id, 0), place(id, 1)];
      if (lengthOf(subtract(to, from)) > 2) sketch.line(from, to, { ...thin, width: 0.7, dash: [1.5, 2] });
    }
    addReleases(
      sheet,
      movedFrame(left, mechanism, factor * (options.share ?? 1)),
      movedAxes(ready.axes, mechanism, factor * (options.share ?? 1)),
    );
    for (const piece of mechanism.pieces) addMotion(sheet, ready.axes, piece);
    addJointNames(sheet, left, ready.axes, ready.signs);
  });
}

function movedFrame(frame: Frame, { joints }: Mechanism, factor: number): Frame {
  return {
    ...frame,
    joints: frame.joints.map((j) => ({ ...j, ...beyond(j, joints[j.id] ?? { x: 0, y: 0 }, factor) })),
  };
}

function movedAxes(
  axes: ReadonlyMap<string, MemberAxis>,
  { joints }: Mechanism,
  factor: number,
): Map<string, MemberAxis> {
  const moved = new Map<string, MemberAxis>();
  for (const [id, axis] of axes) {
    const shift = (joint: string) => scale(joints[joint] ?? { x: 0, y: 0 }, factor);
    const [start, end] = [add(axis.start, shift(axis.member.start)), add(axis.end, shift(axis.member.end))];
    const along = unit(subtract(end, start));
    moved.set(id, { ...axis, start, end, along, left: { x: -along.y, y: along.x } });
  }
  return moved;
}

/** An arrow that tells how a piece moves: about its centre, or along its slide. */
function addMotion({ sketch, view }: Sheet, axes: ReadonlyMap<string, MemberAxis>, piece: Piece): void {
  const middles = piece.members.flatMap((id) => {
    const axis = axes.get(id);
    return axis ? [mix(axis.start, axis.end, 0.5)] : [];
  });
  if (middles.length === 0) return;
  const centroid = view.at(scale(middles.reduce(add), 1 / middles.length));
  if (piece.slide && !piece.centre) {
    const along = unit(view.direction(piece.slide));
    const foot = beyond(centroid, { x: -along.y, y: along.x }, 11);
    sketch.arrow(beyond(foot, along, -11), beyond(foot, along, 11), { ...thin, width: 1.2 });
    return;
  }
  if (!piece.centre) return;
  const centre = view.at(piece.centre);
  const spoke = subtract(centroid, centre);
  const radius = Math.min(34, Math.max(16, 0.55 * lengthOf(spoke)));
  const middle = Math.atan2(spoke.y, spoke.x);
  const half = Math.min(0.5, 14 / radius);
  const sense = piece.rotation > 0 ? -1 : 1;
  addTurnArrow(sketch, centre, radius, middle - sense * half, middle + sense * half, { ...thin, width: 1.2 });
}

function pieceInWords({ members, centre, slide }: Piece): string {
  const who = list(members);
  if (centre) {
    const where = centre.joint ?? `the point ${say(centre.x)}, ${say(centre.y)}`;
    return `${who} turns about ${where}`;
  }
  return slide ? `${who} slides` : `${who} moves`;
}
