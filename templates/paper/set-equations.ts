import { openFraction } from '@/lib/typeset/open-fraction';
import { MATH_SCALE } from '@/lib/typeset/rich-line';
import { splitTopLevel } from '@/lib/typeset/split-top-level';
import { TypesetError } from '@/lib/typeset/typeset-error';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Block, EquationRow } from '../block';
import { type Ink, moved } from './ink';
import { LOOKS, MM } from './paper-look';
import { setLines } from './set-words';
import { plainStrip } from './stack-lines';
import type { Strip } from './strip';

const SIZE = LOOKS.text.size * MATH_SCALE;
/** Equations stand in from the text. */
export const INDENT = 5 * MM;
/** A left-hand side longer than this, em, stands out to the right of the column by itself. */
const LONGEST = 7;
/** The space before a relation, em (TeX's thick space). */
const THICK = 0.2778;
const AIR = 0.85 * MM;
const LEAST = LOOKS.text.leading;
/** The sign opens what follows it, so that a minus after it is a sign and not a subtraction. */
const EQUALS = '{=}\\;\\mathopen{}';

type Piece = { tex: string; laid: ReturnType<Typesetter['tex']>; width: number };

/** Width of the left-hand sides of a sheet, points: its equals signs stand in one column. */
export function equalsColumn(blocks: readonly Block[], typesetter: Typesetter): number {
  let width = 0;
  for (const block of blocks) {
    if (block.kind !== 'equations') continue;
    for (const { lhs, chain } of block.rows) {
      const own = chain.length > 0 ? typesetter.tex(lhs, true).width : 0;
      if (own <= LONGEST) width = Math.max(width, own);
    }
  }
  return width * SIZE;
}

/** One row of a chain of equalities as one strip; it breaks before an equals sign, which then stands in the column. */
export function setEquation(
  row: EquationRow,
  block: string,
  column: number,
  width: number,
  typesetter: Typesetter,
): Strip {
  const set = (tex: string): Piece => {
    const laid = typesetter.tex(tex, true);
    return { tex, laid, width: laid.width * SIZE };
  };
  const lhs = set(row.chain.length > 0 ? row.lhs : '');
  const equals = INDENT + Math.max(column, lhs.width) + THICK * SIZE;
  const hang = row.chain.length > 0 ? INDENT + column + THICK * SIZE : INDENT;
  const lines: { piece: Piece; x: number }[][] = [[]];
  if (lhs.width > 0) lines[0]?.push({ piece: lhs, x: equals - THICK * SIZE - lhs.width });
  let x = row.chain.length > 0 ? equals : INDENT;
  for (const member of members(row)) {
    const [first, ...rest] = inPieces(member, width - hang, width - x, set, row.lhs);
    if (!first) continue;
    if (x + first.width > width && lines.at(-1)?.some(({ piece }) => piece !== lhs)) {
      lines.push([]);
      x = hang;
    }
    lines.at(-1)?.push({ piece: first, x });
    x += first.width + THICK * SIZE;
    for (const piece of rest) {
      lines.push([{ piece, x: hang + 1.2 * SIZE }]);
      x = hang + 1.2 * SIZE + piece.width + THICK * SIZE;
    }
  }
  return stack(lines, row, block, x, hang, width, typesetter);
}

function members({ lhs, chain, boxed }: EquationRow): string[] {
  if (chain.length === 0) return [lhs];
  return chain.map(
    (tex, index) => `${EQUALS}${boxed && index === chain.length - 1 ? `\\boxed{${tex}}` : tex}`,
  );
}

/**
 * A member in pieces that fit: whole, or broken before its relations, or before its plus and minus signs; a fraction that
 * is too wide is opened and broken between the terms of its numerator.
 */
function inPieces(
  tex: string,
  room: number,
  here: number,
  set: (tex: string) => Piece,
  lhs: string,
): Piece[] {
  const whole = set(tex);
  if (whole.width <= Math.max(room, here)) return [whole];
  const ways = [splitTopLevel(tex, 'relations'), splitTopLevel(tex, 'terms'), openFraction(tex)];
  for (const parts of ways) {
    if (parts === undefined || parts.length < 2) continue;
    const pieces: Piece[] = [];
    let line = '';
    for (const part of parts) {
      const start = pieces.length === 0 ? '' : '{}';
      if (line !== '' && set(`${start}${line}${part}`).width > room - 1.2 * SIZE) {
        pieces.push(set(`${start}${line}`));
        line = part;
      } else line += part;
    }
    pieces.push(set(`${pieces.length === 0 ? '' : '{}'}${line}`));
    if (pieces.every((piece) => piece.width <= room - 1.2 * SIZE || pieces.length === 1)) return pieces;
  }
  throw new TypesetError('a formula wider than the page', `${lhs} ${tex}`);
}

function stack(
  lines: { piece: Piece; x: number }[][],
  row: EquationRow,
  block: string,
  end: number,
  hang: number,
  width: number,
  typesetter: Typesetter,
): Strip {
  const ink: Ink[] = [];
  let y = 0;
  for (const line of lines) {
    const up = Math.max(...line.map(({ piece }) => piece.laid.height * SIZE));
    const down = Math.max(...line.map(({ piece }) => piece.laid.depth * SIZE));
    const slack = Math.max(0, LEAST - up - down);
    const base = y + AIR + slack * 0.62 + up;
    for (const { piece, x } of line) {
      ink.push({ kind: 'math', x, y: base, size: SIZE, laid: piece.laid, tex: piece.tex, tone: 'ink' });
    }
    y = base + down + slack * 0.38 + AIR;
  }
  if (row.note !== undefined) {
    const last = ink.at(-1);
    const base = last && 'y' in last ? last.y : y;
    const [only, ...more] = setLines(row.note, LOOKS.text, 'ink', width - end - SIZE, typesetter);
    if (only && more.length === 0) {
      const own = only.ink[0];
      const shift = base - (own && 'y' in own ? own.y : 0);
      ink.push(...only.ink.map((mark) => moved(mark, end + 0.7 * SIZE, shift)));
    } else {
      for (const line of setLines(row.note, LOOKS.text, 'ink', width - hang, typesetter)) {
        ink.push(...line.ink.map((mark) => moved(mark, hang, y)));
        y += line.height;
      }
    }
  }
  return plainStrip(block, y, ink);
}
