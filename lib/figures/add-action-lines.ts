import type { Mechanism } from '@/lib/model/refusal';
import type { Prepared } from './draw-structure';
import type { Sheet } from './fit-drawing';
import { beyond, cross, size as lengthOf, type Point, subtract, turn, unit } from './vector';

const dashDot = [7, 2, 1.2, 2];
const past = 16;

/** Lines of action of the reactions that are left, where they meet in a centre of rotation: they cannot stop it. */
export function addActionLines({ sketch, view }: Sheet, { frame }: Prepared, { pieces }: Mechanism): void {
  const [xs, ys] = [frame.joints.map((j) => j.x), frame.joints.map((j) => j.y)];
  const extent = Math.max(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
  const line = (a: Point, b: Point) =>
    sketch.line(a, b, { stroke: 'ochre', width: 0.8, dash: dashDot, quiet: true });
  for (const { centre } of pieces) {
    if (!centre) continue;
    const meet = view.at(centre);
    for (const joint of frame.joints) {
      for (const direction of heldDirections(joint.support)) {
        const off = subtract(centre, joint);
        const reach = lengthOf(off);
        if (Math.abs(cross(off, direction)) > 1e-6 * extent || reach > 1.5 * extent) continue;
        const at = view.at(joint);
        const along = reach > 1e-9 * extent ? unit(subtract(meet, at)) : view.direction(direction);
        if (reach > 1e-9 * extent) line(beyond(at, along, -past), beyond(meet, along, past));
        else line(beyond(at, along, -2 * past), beyond(at, along, 2 * past));
      }
    }
    sketch.circle(meet, 3.4, { stroke: 'ochre', width: 1, quiet: true });
  }
}

/** Directions in which a support can push, unit vectors. */
function heldDirections(support: Prepared['frame']['joints'][number]['support']): Point[] {
  if (!support) return [];
  const angle = (support.angle * Math.PI) / 180;
  return [
    ...(support.x === 'free' ? [] : [turn({ x: 1, y: 0 }, angle)]),
    ...(support.y === 'free' ? [] : [turn({ x: 0, y: 1 }, angle)]),
  ];
}
