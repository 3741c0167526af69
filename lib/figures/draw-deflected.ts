import type { MemberDiagrams } from '@/lib/engine/diagrams/member-diagrams';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { say } from './describe-structure';
import { addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing, type Sheet } from './fit-drawing';
import { magnitude } from './magnitude';
import type { Frame, MemberAxis } from './member-axis';
import type { PathCommand } from './path';
import { slopeOf } from './polynomial-curve';
import type { Ink } from './sketch';
import { beyond, size as lengthOf, type Point, scale, unit } from './vector';

export interface DeflectedOptions extends DrawOptions {
  /** Displacements are EI0 times the true ones: only the shape is known, no value is written. */
  timesEI0?: boolean;
  /** Places whose displacement is written; by default where it is greatest. */
  marks?: readonly { member: string; at: number }[];
  show?: Show;
}

type Shape = Readonly<Record<string, Pick<MemberDiagrams, 'across' | 'along'>>>;

const arcs = 12;
const figures = 3;

/** The deflected shape over the structure at rest (dashed), exaggerated by a round factor that the drawing states. */
export function drawDeflected(frame: Frame, members: Shape, options: DeflectedOptions): Drawing {
  const ready = prepare(frame);
  const bent = [...ready.axes.values()].flatMap((axis) => {
    const shape = members[axis.member.id];
    return shape ? [{ axis, shape }] : [];
  });
  const greatest = farthest(bent);
  const marks = options.marks ?? (greatest.length > 0 ? [{ member: greatest.member, at: greatest.at }] : []);
  const amount = magnitude(greatest.length, 'movement', frame.units, false, figures);
  const alt =
    greatest.length === 0
      ? 'Nothing moves.'
      : `Deflected shape, exaggerated; the greatest displacement${options.timesEI0 ? '' : `, ${amount.replace('\\unit{', ' ').replace('}', '')},`} is on ${greatest.member} at ${say(greatest.at)} from its start.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    const exact = (2.6 * sheet.size) / (greatest.length * sheet.view.perUnit || 1);
    const factor = options.timesEI0 ? exact : roundDown(exact);
    for (const { axis } of bent) {
      const rest = { stroke: 'ink3', width: 0.7, dash: [2.5, 2.2], quiet: true } as const;
      sheet.sketch.line(sheet.view.at(axis.start), sheet.view.at(axis.end), rest);
    }
    for (const { axis, shape } of bent) {
      const ink = addBentMember(sheet, axis, shape, factor);
      for (const { at } of marks.filter((m) => m.member === axis.member.id)) {
        if (!options.timesEI0) addAmount(sheet, frame, axis, shape, at, factor, ink);
      }
    }
    addStructure(
      sheet,
      { ...ready, axes: new Map() },
      {
        thin: true,
        names: options.width >= 200,
        ...options.show,
      },
    );
    sheet.note = options.timesEI0 ? 'shape only' : `displacements $\\times ${say(factor)}$`;
  });
}

function moved(axis: MemberAxis, shape: Shape[string], s: number): Point {
  const [u, v] = [valueAt(shape.along, s, 'left'), valueAt(shape.across, s, 'left')];
  return { x: u * axis.along.x + v * axis.left.x, y: u * axis.along.y + v * axis.left.y };
}

function addBentMember(
  { sketch, view }: Sheet,
  axis: MemberAxis,
  shape: Shape[string],
  factor: number,
): Ink[] {
  const place = (s: number) => view.at(beyond(axis.at(s), moved(axis, shape, s), factor));
  const tangent = (s: number): Point => {
    const [du, dv] = [
      valueAt(shape.along.map(slopeOf), s, 'left') * factor + 1,
      valueAt(shape.across.map(slopeOf), s, 'left') * factor,
    ];
    const t = { x: du * axis.along.x + dv * axis.left.x, y: du * axis.along.y + dv * axis.left.y };
    return scale(view.direction(t), view.perUnit);
  };
  const commands: PathCommand[] = [['M', place(0)]];
  for (let i = 0; i < arcs; i++) {
    const [a, b] = [(i * axis.length) / arcs, ((i + 1) * axis.length) / arcs];
    const third = (b - a) / 3;
    commands.push(['C', beyond(place(a), tangent(a), third), beyond(place(b), tangent(b), -third), place(b)]);
  }
  const start = sketch.ink.length;
  sketch.path(commands, { stroke: 'pen', width: 1.5, ref: { of: 'member', id: axis.member.id } });
  return sketch.ink.slice(start);
}

function addAmount(
  { sketch, view, size }: Sheet,
  frame: Frame,
  axis: MemberAxis,
  shape: Shape[string],
  s: number,
  factor: number,
  own: Ink[],
): void {
  const motion = moved(axis, shape, s);
  const at = view.at(beyond(axis.at(s), motion, factor));
  const away = unit(view.direction(motion));
  const text = `$${magnitude(lengthOf(motion), 'movement', frame.units, false, figures)}$`;
  const side = { x: -away.y, y: away.x };
  sketch.circle(at, 1.6, { fill: 'pen' });
  sketch.label({
    text,
    size: size * 0.92,
    tone: 'pen',
    own,
    rank: 1,
    spots: [
      { at, toward: away, gap: 3 },
      { at, toward: side, gap: 4 },
      { at, toward: scale(side, -1), gap: 4 },
    ],
  });
}

function farthest(bent: readonly { axis: MemberAxis; shape: Shape[string] }[]) {
  let best = { member: '', at: 0, length: 0 };
  for (const { axis, shape } of bent) {
    for (let i = 0; i <= 48; i++) {
      const at = (i * axis.length) / 48;
      const length = lengthOf(moved(axis, shape, at));
      if (length > best.length * (1 + 1e-9)) best = { member: axis.member.id, at, length };
    }
  }
  return best;
}

/** The round number (1, 1.5, 2, 3, 4, 5, 7 times a power of ten) below a value. */
function roundDown(v: number): number {
  const decade = 10 ** Math.floor(Math.log10(v));
  return ([7, 5, 4, 3, 2, 1.5, 1].find((k) => k * decade <= v) ?? 1) * decade;
}
