import { MATH_SCALE, type RichItem, type RichStyle } from '@/lib/typeset/rich-line';
import { type RichPiece, splitRichText } from '@/lib/typeset/split-rich-text';
import { splitTopLevel } from '@/lib/typeset/split-top-level';
import type { Typesetter } from '@/lib/typeset/typesetter';

/** An item that a line cannot break within, with `gap` the space before it that a break swallows (points). */
export type Atom = { readonly items: readonly RichItem[]; readonly width: number; readonly gap: number };

type Open = { items: RichItem[]; width: number; gap: number };

/** Figures and signs only: what is printed bold in a table's totals. */
const NUMBER = /^[-+−\d.,\s\\{}]*$/;

/** Cuts rich text into atoms: words, formulas, and what clings to them without a space. */
export function setAtoms(text: string, style: RichStyle, room: number, typesetter: Typesetter): Atom[] {
  const atoms: Open[] = [];
  let gap = 0;
  let glued = false;
  const add = (item: Omit<RichItem, 'x'>) => {
    const open = atoms.at(-1);
    if (glued && open) {
      open.items.push({ ...item, x: open.width } as RichItem);
      open.width += item.width;
    } else
      atoms.push({ items: [{ ...item, x: 0 } as RichItem], width: item.width, gap: atoms.length ? gap : 0 });
    glued = true;
    gap = 0;
  };
  for (const piece of splitRichText(text)) {
    if (piece.kind === 'tex') {
      for (const item of setFormula(piece, style, room, typesetter)) {
        add(item);
        if (item.broken) glued = false;
      }
      continue;
    }
    const face = piece.bold ? style.bold : style.regular;
    const space = typesetter.text(' ', face).width * style.size + (style.tracking ?? 0) * style.size;
    for (const part of piece.text.split(/( +|\n)/)) {
      if (part === '') continue;
      if (/^[ \n]/.test(part)) {
        gap += part === '\n' ? Number.POSITIVE_INFINITY : space;
        glued = false;
      } else for (const bit of setWord(part, face, style, room, typesetter)) add(bit);
    }
  }
  return atoms;
}

function setWord(
  word: string,
  face: RichStyle['regular'],
  style: RichStyle,
  room: number,
  typesetter: Typesetter,
): Omit<Extract<RichItem, { kind: 'words' }>, 'x'>[] {
  const shaped = typesetter.text(word, face);
  const width = (shaped.width + (style.tracking ?? 0) * [...word].length) * style.size;
  if (width <= room || [...word].length < 2) return [{ kind: 'words', size: style.size, width, shaped }];
  // A word longer than the line (a long reference without a space) is cut where it must be.
  const letters = [...word];
  const half = Math.ceil(letters.length / 2);
  return [letters.slice(0, half), letters.slice(half)].flatMap((part) =>
    setWord(part.join(''), face, style, room, typesetter),
  );
}

function setFormula(
  piece: RichPiece,
  style: RichStyle,
  room: number,
  typesetter: Typesetter,
): (Omit<Extract<RichItem, { kind: 'math' }>, 'x'> & { broken?: boolean })[] {
  const size = style.size * MATH_SCALE;
  const set = (source: string) => {
    const tex = piece.bold && NUMBER.test(source) ? `\\boldsymbol{${source}}` : source;
    const laid = typesetter.tex(tex, false);
    return { kind: 'math' as const, size, width: laid.width * size, laid, tex };
  };
  const whole = set(piece.text);
  if (whole.width <= room) return [whole];
  const parts = splitTopLevel(piece.text, 'relations').flatMap((part) =>
    set(part).width <= room ? [part] : splitTopLevel(part, 'terms'),
  );
  return parts.map((part, index) => ({
    ...set(index === 0 ? part : `{}${part}`),
    broken: index < parts.length - 1,
  }));
}
