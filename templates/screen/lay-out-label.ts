import type { TextBox } from '@/lib/figures/measure-text';
import { classMeaning } from '@/lib/typeset/katex-class';
import { em, type KatexNode, katexBases } from '@/lib/typeset/katex-tree';
import { splitRichText } from './split-rich-text';

/** A run of one face in a label. x, y, size and width in em of the label; y runs up from the baseline. */
export interface LabelRun {
  text: string;
  face: 'words' | 'main' | 'math';
  bold: boolean;
  italic: boolean;
  size: number;
  x: number;
  y: number;
  width: number;
}

export interface LabelLayout {
  runs: LabelRun[];
  width: number;
  height: number;
  depth: number;
}

const kept = new Map<string, LabelLayout>();
/** Mean advance of Inter over English text, em of its own size; a browser sets the words, so nothing is misplaced by it. */
const wordAdvance = 0.56;
/** Words stand beside mathematics at this share of its size, as everywhere on a sheet. */
const wordSize = 0.885;
/** TeX's null delimiter space at either side of a fraction, em. */
const nullDelimiter = 0.12;

/** Lays out a label with KaTeX's own metrics: letters, scripts and accents, which is all that labels hold. */
export function layOutLabel(text: string): LabelLayout {
  const known = kept.get(text);
  if (known) return known;
  const made = layOut(text);
  if (kept.size > 4_000) kept.clear();
  kept.set(text, made);
  return made;
}

/** Measures labels for lib/figures: points for a size in points. */
export function measureLabel(text: string, size: number): TextBox {
  const { width, height, depth } = layOutLabel(text);
  return { width: width * size, height: height * size, depth: depth * size };
}

/** Width in em of the widest piece of a formula that KaTeX keeps on one line; nought where it cannot be set. */
export function widestPiece(tex: string): number {
  try {
    return Math.max(...katexBases(tex, false).map((base) => place(base, root, 0, 0, [])), 0);
  } catch {
    return 0;
  }
}

function layOut(text: string): LabelLayout {
  const layout: LabelLayout = { runs: [], width: 0, height: 0.66, depth: 0 };
  for (const piece of splitRichText(text)) {
    if (piece.kind !== 'tex') {
      const width = piece.text.length * wordAdvance * wordSize;
      const face = { face: 'words', bold: piece.kind === 'bold', italic: false } as const;
      layout.runs.push({ text: piece.text, ...face, size: wordSize, x: layout.width, y: 0, width });
      layout.width += width;
      layout.depth = Math.max(layout.depth, 0.2);
      continue;
    }
    for (const base of katexBases(piece.text, false)) {
      layout.height = Math.max(layout.height, base.height ?? 0);
      layout.depth = Math.max(layout.depth, base.depth ?? 0);
      layout.width = place(base, root, layout.width, 0, layout.runs);
    }
  }
  return layout;
}

interface Inherited {
  family: string;
  bold: boolean;
  italic: boolean;
  size: number;
  align: 'left' | 'centre' | 'right';
}

const root: Inherited = { family: 'Main', bold: false, italic: false, size: 1, align: 'left' };

/** Places a node at (x, y) and returns where it ends. */
function place(node: KatexNode, from: Inherited, x: number, y: number, runs: LabelRun[]): number {
  const meaning = classMeaning(node.classes ?? [], '');
  if (meaning.role === 'nothing') return x;
  if (meaning.role === 'null-delimiter') return x + nullDelimiter * from.size;
  const to: Inherited = {
    family: meaning.family ?? from.family,
    bold: meaning.bold ?? from.bold,
    italic: meaning.italic ?? from.italic,
    size: from.size * meaning.scale,
    align: meaning.align ?? from.align,
  };
  const start = x + (em(node.style?.marginLeft) + em(node.style?.paddingLeft)) * to.size;
  const after = em(node.style?.marginRight) * to.size;
  if (node.text !== undefined) return placeSymbol(node, to, start, y, runs) + after;
  if (meaning.role === 'stack') return placeStack(node, to, start, y, runs) + after;
  const shift = em(node.style?.left) * to.size;
  let at = start + shift;
  for (const child of node.children ?? []) at = place(child, to, at, y, runs);
  return (meaning.zeroWidth ? start : at - shift) + after;
}

function placeStack(node: KatexNode, to: Inherited, x: number, y: number, runs: LabelRun[]): number {
  const rows = (node.children?.[0]?.children?.[0]?.children ?? []).map((row) => {
    const own: LabelRun[] = [];
    const strut = row.children?.find((child) => child.classes?.includes('pstrut'));
    const rise = -(em(row.style?.top) + em(strut?.style?.height)) * to.size;
    return { own, width: place(row, to, 0, y + rise, own) };
  });
  const inner = Math.max(0, ...rows.map((row) => row.width));
  for (const { own, width } of rows) {
    const share = { left: 0, centre: 0.5, right: 1 }[to.align];
    for (const run of own) runs.push({ ...run, x: x + run.x + share * (inner - width) });
  }
  return x + inner;
}

function placeSymbol(node: KatexNode, to: Inherited, x: number, y: number, runs: LabelRun[]): number {
  const text = (node.text ?? '').replaceAll('\u200b', '');
  if (text === '') return x;
  const width = advanceOf(node, text, to) * to.size;
  const face = to.family === 'Math' ? 'math' : 'main';
  runs.push({ text, face, bold: to.bold, italic: to.italic, size: to.size, x, y, width });
  return x + width + Math.max(node.italic ?? 0, 0) * to.size;
}

const advances = new Map<string, number>();

/** KaTeX tells the width of a symbol; where it joined several into one text, each is asked for on its own. */
function advanceOf(node: KatexNode & { width?: number }, text: string, to: Inherited): number {
  const letters = [...text];
  if (letters.length === 1) return node.width ?? 0.5;
  const command = to.family === 'Math' ? '' : to.bold ? '\\mathbf' : to.italic ? '\\mathit' : '\\mathrm';
  let sum = 0;
  for (const letter of letters) {
    const key = `${command}{${letter}}`;
    let width = advances.get(key);
    if (width === undefined) {
      width = widthOf(katexBases(key, false)[0]) ?? 0.5;
      advances.set(key, width);
    }
    sum += width;
  }
  return sum;
}

function widthOf(node: (KatexNode & { width?: number }) | undefined): number | undefined {
  if (!node) return undefined;
  if (node.text !== undefined && node.text !== '\u200b') return node.width;
  for (const child of node.children ?? []) {
    const width = widthOf(child);
    if (width !== undefined) return width;
  }
  return undefined;
}
