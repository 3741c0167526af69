import type { Support } from '@/lib/model/structure';
import type { ShapeRef } from './drawing';
import type { Sketch, Style } from './sketch';
import { beyond, dot, type Point, scale, turn } from './vector';

/** How a support is drawn: which sign, and towards which side the ground lies (unit vector, model axes). */
export interface SupportSign {
  kind: 'fixed' | 'pinned' | 'roller' | 'guided' | 'clamp' | 'none';
  ground: Point;
  springs: { toward: Point }[];
  turnSpring: boolean;
  /** A circle at the tip, where one member ends on it; under a member that runs through it would read as a hinge. */
  tip: boolean;
  /** A second translation held beside a spring: a link towards its wall. */
  link?: Point;
}

const nearby = Math.cos((35 * Math.PI) / 180);

/** The trade's sign for a support. `members` are the unit directions in which members leave its joint. */
export function supportSign(support: Support, members: readonly Point[]): SupportSign {
  const angle = (support.angle * Math.PI) / 180;
  const [x, y] = [turn({ x: 1, y: 0 }, angle), turn({ x: 0, y: 1 }, angle)];
  const down = scale(y, -1);
  const free = (...sides: Point[]): Point =>
    sides.find((side) => members.every((m) => dot(m, side) < nearby)) ?? (sides[0] as Point);
  const back = scale(x, -1);
  const heldX = support.x === 'held';
  const heldY = support.y === 'held';
  const heldTurn = support.turn === 'held';
  const sprung = (r: Support['x']) => typeof r === 'object';
  const springs = [
    ...(sprung(support.y) ? [{ toward: free(down, y) }] : []),
    ...(sprung(support.x) ? [{ toward: free(back, x) }] : []),
  ];
  const turnSpring = sprung(support.turn);
  const rest = { springs, turnSpring, tip: members.length === 1 };
  if (heldX && heldY) {
    const only = members.length === 1 ? members[0] : undefined;
    if (heldTurn) return { kind: 'fixed', ground: only ? scale(only, -1) : free(down, y, back, x), ...rest };
    return { kind: 'pinned', ground: free(down, y, back, x), ...rest };
  }
  const held = heldY ? free(down, y) : heldX ? free(back, x) : undefined;
  if (held && springs.length > 0)
    return { kind: 'none', ground: springs[0]?.toward ?? held, link: held, ...rest };
  if (held) return { kind: heldTurn ? 'guided' : 'roller', ground: held, ...rest };
  return { kind: heldTurn ? 'clamp' : 'none', ground: springs[0]?.toward ?? down, ...rest };
}

/** Reach of a sign from its joint towards the ground, points. */
export function signReach(sign: SupportSign): number {
  if (sign.springs.length > 0) return 25;
  return { fixed: 5, pinned: 16, roller: 18, guided: 9, clamp: 6, none: 0 }[sign.kind];
}

const line: Style = { stroke: 'ink', width: 1.2 };
const body: Style = { ...line, fill: 'paper' };

/** Draws a sign at a joint; `ground` and the rest of `sign` in page directions. */
export function drawSupportSign(sketch: Sketch, at: Point, sign: SupportSign, ref: ShapeRef): void {
  const { ground } = sign;
  const along = { x: -ground.y, y: ground.x };
  const local = (u: number, v: number): Point => beyond(beyond(at, along, u), ground, v);
  switch (sign.kind) {
    case 'fixed':
      drawGround(sketch, at, ground, 9, ref);
      break;
    case 'pinned':
      sketch.poly([at, local(-6.5, 11), local(6.5, 11)], true, { ...body, ref });
      drawGround(sketch, local(0, 11), ground, 9.5, ref);
      if (sign.tip) sketch.circle(at, 2, { ...body, ref });
      break;
    case 'roller':
      sketch.poly([at, local(-6, 9), local(6, 9)], true, { ...body, ref });
      for (const u of [-3.6, 3.6]) sketch.circle(local(u, 10.9), 1.7, { ...body, width: 0.9, ref });
      drawGround(sketch, local(0, 12.8), ground, 9.5, ref);
      if (sign.tip) sketch.circle(at, 2, { ...body, ref });
      break;
    case 'guided':
      sketch.line(local(-7.5, 0), local(7.5, 0), { ...line, width: 1.8, ref });
      for (const u of [-4.2, 4.2]) sketch.circle(local(u, 2.4), 1.7, { ...body, width: 0.9, ref });
      drawGround(sketch, local(0, 4.3), ground, 9.5, ref);
      break;
    case 'clamp':
      sketch.poly([local(-4.5, -4.5), local(4.5, -4.5), local(4.5, 4.5), local(-4.5, 4.5)], true, {
        ...body,
        ref,
      });
      break;
    case 'none':
      break;
  }
  for (const { toward } of sign.springs) drawSpring(sketch, at, toward, ref);
  if (sign.link) drawLink(sketch, at, sign.link, ref);
  if (sign.turnSpring) drawTurnSpring(sketch, at, ref);
}

function drawGround(sketch: Sketch, centre: Point, ground: Point, half: number, ref: ShapeRef): void {
  const along = { x: -ground.y, y: ground.x };
  sketch.line(beyond(centre, along, -half), beyond(centre, along, half), { ...line, ref });
  const strokes = Math.round(half / 1.9);
  for (let i = 0; i < strokes; i++) {
    const from = beyond(centre, along, half - 0.4 - (i * 2 * (half - 2)) / strokes);
    sketch.line(from, beyond(beyond(from, ground, 3.8), along, -3.8), { stroke: 'ink2', width: 0.6, ref });
  }
}

function drawSpring(sketch: Sketch, at: Point, toward: Point, ref: ShapeRef): void {
  const along = { x: -toward.y, y: toward.x };
  const teeth = [0, 0, 1, -1, 1, -1, 1, -1, 0, 0];
  const steps = [0, 3, 4.3, 6.9, 9.5, 12.1, 14.7, 17.3, 18.6, 21];
  const points = teeth.map((u, i) => beyond(beyond(at, along, u * 3.6), toward, steps[i] ?? 0));
  sketch.poly(points, false, { ...line, width: 1.1, ref });
  drawGround(sketch, beyond(at, toward, 21), toward, 8, ref);
}

function drawLink(sketch: Sketch, at: Point, toward: Point, ref: ShapeRef): void {
  sketch.line(at, beyond(at, toward, 13), { ...line, ref });
  sketch.circle(beyond(at, toward, 13), 1.7, { ...body, width: 0.9, ref });
  drawGround(sketch, beyond(at, toward, 15), toward, 7, ref);
}

/** A spiral of one turn and a half, ending on a small ground line. */
function drawTurnSpring(sketch: Sketch, at: Point, ref: ShapeRef): void {
  const points = Array.from({ length: 28 }, (_, i) => {
    const angle = (i * Math.PI) / 9;
    const r = 2 + i * 0.26;
    return { x: at.x + r * Math.cos(angle), y: at.y + r * Math.sin(angle) };
  });
  sketch.poly(points, false, { ...line, width: 0.9, ref });
}
