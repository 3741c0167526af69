import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Ink } from './ink';
import { LOOKS, type PaperTone } from './paper-look';
import { wordInk } from './set-words';

/** Marks of checking as strokes 7.5 pt wide, standing on the baseline of their line. */
const stroke =
  (d: string, tone: PaperTone) =>
  (x: number, y: number): Ink[] => [{ kind: 'stroke', x, y, d, width: 1.15, tone }];

/** Agrees. */
export const tickIcon = stroke('M0.3 -3.6L2.9 -0.9L7.9 -6.6', 'tick');
/** Correct this. */
export const crossIcon = stroke('M0.8 -6.6L6.6 -0.6M6.6 -6.6L0.8 -0.6', 'ochre');
/** Query. */
export const queryIcon = stroke(
  'M1.4 -5.4C1.4 -8.2 5.8 -8 5.8 -5.4C5.8 -3.8 3.6 -3.9 3.6 -2.1M3.6 -0.9L3.6 0.2',
  'violet',
);

/** Changed in revision n: a triangle with the number, its right corner at x. */
export function deltaIcon(revision: number, x: number, y: number, typesetter: Typesetter): Ink[] {
  const width = 12.4;
  const left = x - width;
  const number = { ...LOOKS.source, size: 6.2, regular: 'Inter-600' as const };
  return [
    { kind: 'stroke', x: left, y, d: `M${width / 2} -9L${width} 1.6L0 1.6Z`, width: 0.9, tone: 'ink' },
    wordInk(`${revision}`, number, 'ink', { x: left + width / 2, y: y + 0.1, side: 'centre' }, typesetter),
  ];
}
