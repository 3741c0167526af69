import type { RichItem, RichLine, RichStyle } from '@/lib/typeset/rich-line';
import { type Atom, setAtoms } from '@/lib/typeset/set-atoms';
import { TypesetError } from '@/lib/typeset/typeset-error';
import type { Typesetter } from '@/lib/typeset/typesetter';

/** Reach of Inter's letters above and below the baseline, em (its cap height and the depth of its p). */
const TEXT_HEIGHT = 0.73;
const TEXT_DEPTH = 0.21;
/** Lengths that differ by less are equal: sums of many advances in floating point. */
const SLACK = 0.01;

/**
 * Breaks rich text into lines no wider than `width` points: greedy, at spaces. A formula stays whole unless it is
 * wider than a line by itself; then it breaks before a relation. Throws a TypesetError if it still does not fit.
 */
export function breakRich(text: string, style: RichStyle, width: number, typesetter: Typesetter): RichLine[] {
  const lines: RichLine[] = [];
  let items: RichItem[] = [];
  let end = 0;
  const close = () => {
    if (items.length > 0) lines.push(finish(items, end, style));
    items = [];
    end = 0;
  };
  for (const atom of setAtoms(text, style, width, typesetter)) {
    if (items.length > 0 && end + atom.gap + atom.width > width + SLACK) close();
    if (items.length === 0 && atom.width > width + SLACK) {
      for (const item of fitAlone(atom, width, text)) {
        if (items.length > 0 && end + item.width > width + SLACK) close();
        items.push({ ...item, x: end });
        end += item.width;
      }
      continue;
    }
    const start = items.length > 0 ? end + atom.gap : 0;
    items.push(...atom.items.map((item) => ({ ...item, x: start + item.x })));
    end = start + atom.width;
  }
  close();
  return lines;
}

/** The items of an atom that is wider than a line; each must fit one. */
function fitAlone(atom: Atom, width: number, text: string): readonly RichItem[] {
  const wide = atom.items.find((item) => item.width > width + SLACK);
  if (!wide) return atom.items;
  throw new TypesetError(
    wide.kind === 'math' ? `the formula $${wide.tex}$ in this width` : 'a word in this width',
    text,
  );
}

function finish(items: readonly RichItem[], width: number, style: RichStyle): RichLine {
  let height = TEXT_HEIGHT * style.size;
  let depth = TEXT_DEPTH * style.size;
  for (const item of items) {
    if (item.kind !== 'math') continue;
    height = Math.max(height, item.laid.height * item.size);
    depth = Math.max(depth, item.laid.depth * item.size);
  }
  return { items, width, height, depth };
}
