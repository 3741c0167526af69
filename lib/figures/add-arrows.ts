import type { Sketch, Style } from './sketch';
import { beyond, type Point } from './vector';

/** An arc around a point with an arrowhead at its end; angles in radians on the page, y down, clockwise positive. */
export function addTurnArrow(
  sketch: Sketch,
  centre: Point,
  radius: number,
  from: number,
  to: number,
  style: Style,
): void {
  const at = (angle: number): Point => ({
    x: centre.x + radius * Math.cos(angle),
    y: centre.y + radius * Math.sin(angle),
  });
  const sense = Math.sign(to - from);
  const headAngle = (5.5 / radius) * sense;
  const pieces = Math.max(1, Math.ceil(Math.abs(to - from) / (Math.PI / 2)));
  const stop = to - headAngle * 0.7;
  const step = (stop - from) / pieces;
  const pull = (4 / 3) * Math.tan(step / 4) * radius;
  const tangent = (angle: number): Point => ({ x: -Math.sin(angle), y: Math.cos(angle) });
  sketch.path(
    [
      ['M', at(from)],
      ...Array.from({ length: pieces }, (_, i) => {
        const [a, b] = [from + i * step, from + (i + 1) * step];
        return ['C', beyond(at(a), tangent(a), pull), beyond(at(b), tangent(b), -pull), at(b)] as const;
      }).map(([c, p, q, r]): ['C', Point, Point, Point] => [c, p, q, r]),
    ],
    style,
  );
  const t = tangent(to - headAngle * 0.5);
  sketch.head(at(to), { x: t.x * sense, y: t.y * sense }, style, 5.5);
}
