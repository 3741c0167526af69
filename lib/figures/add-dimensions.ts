import type { UnitSet } from '@/lib/model/analysis';
import type { Sheet } from './fit-drawing';
import type { Frame } from './member-axis';
import type { Style } from './sketch';
import { beyond, type Point } from './vector';
import { exactDecimals, writeNumber } from './write-number';

/** Places beside the joints that get a dimension of their own: load ends, loads. Model coordinates. */
export interface Stations {
  x: readonly number[];
  y: readonly number[];
}

const line: Style = { stroke: 'ink3', width: 0.6 };
const tick: Style = { stroke: 'ink2', width: 1 };
const off = 13;
const between = 16;
/** Distance of a second chain where a label of the first has to stand below its line. */
const apart = 27;

/** Chains of dimensions below and to the right of all that is drawn so far, in the sheet's unit of length. */
export function addDimensions(sheet: Sheet, frame: Frame, stations: Stations = { x: [], y: [] }): void {
  const { view, sketch } = sheet;
  const [xs, ys] = [frame.joints.map((j) => j.x), frame.joints.map((j) => j.y)];
  const below = sketch.bounds.bottom + off;
  chainsOf(xs, stations.x).forEach((stops, i, all) => {
    const y = below + i * step(sheet, frame.units, all[0]);
    addChain(sheet, frame.units, stops, (v) => ({ x: view.at({ x: v, y: 0 }).x, y }), { x: 1, y: 0 });
  });
  const beside = sketch.bounds.right + off;
  chainsOf(ys, stations.y).forEach((stops, i, all) => {
    const x = beside + i * step(sheet, frame.units, all[0]);
    addChain(sheet, frame.units, stops, (v) => ({ x, y: view.at({ x: 0, y: v }).y }), { x: 0, y: -1 });
  });
}

function step({ sketch, size, view }: Sheet, units: UnitSet, stops: readonly number[] = []): number {
  const tight = stretches(stops).some(({ from, to, count }) => {
    const text = `$${writeNumber((to - from) / count, 2, units)}$`;
    return sketch.measure(text, size * 0.9).width + 4 > (to - from) * view.perUnit;
  });
  return tight ? apart : between;
}

/** The chain of the joints alone, under a chain that has the stations as well where there are any. */
function chainsOf(joints: readonly number[], stations: readonly number[]): number[][] {
  const own = distinct(joints);
  const all = distinct([...joints, ...stations]);
  if (own.length < 2) return [];
  return all.length > own.length ? [all, own] : [own];
}

function distinct(values: readonly number[]): number[] {
  const sorted = values.toSorted((a, b) => a - b);
  const reach = Math.max(...sorted.map(Math.abs), 0) * 1e-9;
  return sorted.filter((v, i) => i === 0 || v - (sorted[i - 1] ?? v) > reach);
}

/** Stretches of a chain; more than six equal ones in a row are written together as 8 × 3.00. */
function stretches(stops: readonly number[]): { from: number; to: number; count: number }[] {
  const parts: { from: number; to: number; count: number }[] = [];
  for (let i = 1; i < stops.length; i++) {
    const [from, to] = [stops[i - 1] as number, stops[i] as number];
    const last = parts.at(-1);
    const each = last && (last.to - last.from) / last.count;
    if (last && each && Math.abs(to - from - each) < 1e-9 * Math.abs(each) + 1e-12) {
      last.to = to;
      last.count++;
    } else parts.push({ from, to, count: 1 });
  }
  return parts.flatMap((p) =>
    p.count > 6
      ? [p]
      : Array.from({ length: p.count }, (_, i) => ({
          from: p.from + ((p.to - p.from) * i) / p.count,
          to: p.from + ((p.to - p.from) * (i + 1)) / p.count,
          count: 1,
        })),
  );
}

function addChain(
  { sketch, size }: Sheet,
  units: UnitSet,
  stops: readonly number[],
  at: (v: number) => Point,
  along: Point,
): void {
  const across = { x: -along.y, y: along.x };
  const [first, last] = [at(stops[0] as number), at(stops.at(-1) as number)];
  sketch.line(beyond(first, along, -3), beyond(last, along, 3), line);
  for (const stop of stops) {
    const p = at(stop);
    sketch.line(beyond(p, across, -4), beyond(p, across, 4), line);
    const slant = {
      x: along.x + across.x * (along.y === 0 ? -1 : 1),
      y: along.y + across.y * (along.y === 0 ? -1 : 1),
    };
    sketch.line(beyond(p, slant, -2.3), beyond(p, slant, 2.3), tick);
  }
  const parts = stretches(stops);
  const decimals = exactDecimals(
    parts.map((p) => (p.to - p.from) / p.count),
    2,
    4,
  );
  for (const { from, to, count } of parts) {
    const text = writeNumber((to - from) / count, decimals, units);
    const [a, b] = [at(from), at(to)];
    const middle = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
    const above = along.y === 0 ? { x: 0, y: -1 } : { x: -1, y: 0 };
    const under = { x: -above.x, y: -above.y };
    sketch.label({
      text: count > 1 ? `$${count}\\times ${text}$` : `$${text}$`,
      size: size * 0.9,
      tone: 'ink2',
      turn: along.y === 0 ? 0 : 90,
      spots: [
        { at: middle, toward: above, gap: 2 },
        { at: middle, toward: under, gap: 2 },
      ],
      own: [{ a: first, b: last }],
      rank: 0,
    });
  }
}
