import type { MemberDiagrams } from '@/lib/engine/diagrams/member-diagrams';
import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { addDiagram, spotsAt } from './add-diagram';
import { list, say } from './describe-structure';
import { addMeasures, addStructure, type Prepared, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing, type Sheet } from './fit-drawing';
import { type MarkedValue, markedValues, zerosOf } from './marked-values';
import type { Frame, MemberAxis } from './member-axis';
import { greatestOf } from './polynomial-curve';
import { decimalsFor, writeNumber } from './write-number';

export type Which = 'N' | 'V' | 'M';

export interface DiagramOptions extends DrawOptions {
  which: Which;
  /** Decimals of all labels; by default four significant figures of the greatest value. */
  decimals?: number;
  /** The value drawn tallest, so that several drawings share a scale; by default the greatest of this one. */
  greatest?: number;
  show?: Show;
}

const units = { US: { force: 'kip', moment: 'kip·ft' }, SI: { force: 'kN', moment: 'kN·m' } };

/**
 * N, V or M of every member, each value signed. Moments are drawn on the tension side; N and V, when positive, on the
 * left of the walk. Labels: ends, jumps, peaks; zeros of M as dots.
 */
export function drawDiagram(
  frame: Frame,
  members: Readonly<Record<string, Pick<MemberDiagrams, 'N' | 'V' | 'M'>>>,
  options: DiagramOptions,
): Drawing {
  const { which, show = {} } = options;
  const ready = prepare(frame);
  const curves = curvesOf(ready, (id) => members[id]?.[which]);
  const own = Math.max(...curves.map((c) => greatestOf(c.curve)), 0);
  const decimals = options.decimals ?? decimalsFor([own]);
  const unit = units[frame.units][which === 'M' ? 'moment' : 'force'];
  const told = curves.flatMap(({ axis, curve }) =>
    markedValues(curve, own).map((m) => `${axis.member.id} ${valueInWords(m, axis)}`),
  );
  const alt =
    own === 0 ? `${names[which]} is zero everywhere.` : `${names[which]} in ${unit}: ${list(told)}.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    addCurves(sheet, ready, curves, {
      which,
      greatest: options.greatest ?? own,
      decimals,
      zeros: which === 'M',
    });
    addStructure(sheet, ready, { thin: true, names: options.width >= 200, ...show });
    addMeasures(sheet, ready, show);
  });
}

const names = { N: 'Axial force', V: 'Shear', M: 'Bending moment' };

function valueInWords(mark: MarkedValue, axis: MemberAxis): string {
  const place =
    mark.at === 'start'
      ? `at ${axis.member.start}`
      : mark.at === 'end'
        ? `at ${axis.member.end}`
        : `at ${Number(mark.s.toPrecision(3))} from ${axis.member.start}`;
  return `${say(mark.value)} ${place}`;
}

export interface Curve {
  axis: MemberAxis;
  curve: PiecewisePolynomial;
}

export function curvesOf(
  { axes }: Prepared,
  of: (member: string) => PiecewisePolynomial | undefined,
): Curve[] {
  return [...axes.values()].flatMap((axis) => {
    const curve = of(axis.member.id);
    return curve && curve.length > 0 ? [{ axis, curve }] : [];
  });
}

/** Diagrams of several members at one scale, with their labels. */
export function addCurves(
  sheet: Sheet,
  { frame }: Prepared,
  curves: readonly Curve[],
  look: { which: Which; greatest: number; decimals: number; zeros: boolean; reach?: number },
): void {
  const { sketch, size, view } = sheet;
  if (look.greatest === 0) return;
  const reach = look.reach ?? 3.2 * size;
  const ordinates = { perValue: reach / look.greatest, side: look.which === 'M' ? -1 : 1 } as const;
  const told = new Set<string>();
  for (const { axis, curve } of curves) {
    if (greatestOf(curve) <= 1e-9 * look.greatest) continue;
    const ref = { of: 'member', id: axis.member.id } as const;
    const { tip, out, ink } = addDiagram(sheet, axis, curve, ordinates, ref);
    if (look.zeros)
      for (const s of zerosOf(curve)) sketch.circle(view.at(axis.at(s)), 1.5, { fill: 'ink', quiet: true });
    for (const mark of markedValues(curve, look.greatest)) {
      const text = writeNumber(mark.value, look.decimals, frame.units, true);
      if (look.which === 'M' && isToldBefore(mark, axis, frame, text, told)) continue;
      sketch.label({
        text: `$${text}$`,
        size: size * 0.92,
        spots: spotsAt(tip(mark.s, mark.value), out, mark.value),
        own: ink,
        rank: mark.at === 'inside' ? 1 : 2,
        ref,
      });
    }
  }
}

/** Where just two member ends meet they have one moment: it is written once. */
function isToldBefore(
  mark: MarkedValue,
  axis: MemberAxis,
  frame: Frame,
  text: string,
  told: Set<string>,
): boolean {
  if (mark.at === 'inside') return false;
  const joint = mark.at === 'start' ? axis.member.start : axis.member.end;
  const ends = frame.members.flatMap((m) => [m.start, m.end]).filter((id) => id === joint);
  if (ends.length !== 2) return false;
  const key = `${joint} ${text.replace(/^[+-]/, '')}`;
  if (told.has(key)) return true;
  told.add(key);
  return false;
}
