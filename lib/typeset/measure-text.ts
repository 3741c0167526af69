import { breakRich } from '@/lib/typeset/break-rich';
import { MATH_SCALE } from '@/lib/typeset/rich-line';
import type { Typesetter } from '@/lib/typeset/typesetter';

/**
 * Extent of a label in points, from the fonts themselves: `size` is that of its mathematics, words are smaller by
 * MATH_SCALE, as drawings on paper set them. Empty text has no extent. Throws a TypesetError as breakRich does.
 */
export function measureText(
  text: string,
  size: number,
  typesetter: Typesetter,
): { width: number; height: number; depth: number } {
  const style = { size: size / MATH_SCALE, regular: 'Inter-400', bold: 'Inter-600' } as const;
  const [line] = breakRich(text, style, Number.POSITIVE_INFINITY, typesetter);
  return line
    ? { width: line.width, height: line.height, depth: line.depth }
    : { width: 0, height: 0, depth: 0 };
}
