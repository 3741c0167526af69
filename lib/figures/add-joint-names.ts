import type { Sheet } from './fit-drawing';
import { directionsFrom, type Frame, type MemberAxis } from './member-axis';
import { nameInTex } from './name-in-tex';
import type { LabelSpot } from './place-labels';
import { type SupportSign, signReach } from './support-symbol';
import { dot, type Point, unit } from './vector';

const eight: readonly Point[] = [
  { x: -1, y: -1 },
  { x: 1, y: -1 },
  { x: 1, y: 1 },
  { x: -1, y: 1 },
  { x: -1, y: 0 },
  { x: 1, y: 0 },
  { x: 0, y: -1 },
  { x: 0, y: 1 },
].map(unit);

/** The name of every joint, on the side where least is drawn. `closest`: names are left out of denser structures. */
export function addJointNames(
  { sketch, view, size }: Sheet,
  frame: Frame,
  axes: ReadonlyMap<string, MemberAxis>,
  signs: ReadonlyMap<string, SupportSign>,
): void {
  for (const joint of frame.joints) {
    const at = view.at(joint);
    const lines = directionsFrom(joint.id, axes).map(view.direction);
    const sign = signs.get(joint.id);
    if (sign && sign.kind !== 'fixed') lines.push(view.direction(sign.ground));
    const crowd = (v: Point) => Math.max(-1, ...lines.map((l) => dot(l, v)));
    const toward = eight.toSorted((a, b) => Math.round(8 * (crowd(a) - crowd(b))));
    const spots: LabelSpot[] = toward.map((v) => ({ at, toward: v, gap: 3.5 }));
    if (sign && signReach(sign) > 8) {
      const ground = view.direction(sign.ground);
      const beside = { x: at.x + 11 * ground.x, y: at.y + 11 * ground.y };
      for (const k of [-1, 1])
        spots.unshift({ at: beside, toward: { x: -k * ground.y, y: k * ground.x }, gap: 10 });
    }
    const [first, ...rest] = spots;
    if (!first) continue;
    sketch.label({
      text: `$${nameInTex(joint.id)}$`,
      size: size * 1.08,
      spots: [first, ...rest],
      rank: 3,
      ref: { of: 'joint', id: joint.id },
    });
  }
}
