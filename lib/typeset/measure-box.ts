import type { Box, StackRow } from '@/lib/typeset/box';
import type { Face, FaceName, Faces, Glyph } from '@/lib/typeset/face';
import { type Align, type ClassMeaning, classMeaning } from '@/lib/typeset/katex-class';
import { em, type KatexNode } from '@/lib/typeset/katex-tree';
import { TypesetError } from '@/lib/typeset/typeset-error';

/** What a node takes from those above it. */
type Inherited = {
  readonly family: string;
  readonly bold: boolean;
  readonly italic: boolean;
  readonly size: number;
  readonly align: Align;
  readonly colour?: string;
};

export const ROOT: Inherited = { family: 'Main', bold: false, italic: false, size: 1, align: 'left' };

const ZERO_WIDTH_SPACE = 0x200b;
const NULL_DELIMITER_WIDTH = 0.12;
/** Where a face lacks a character: the faces a browser would reach, in order. */
const FALLBACKS: readonly FaceName[] = ['KaTeX_Main-Regular', 'KaTeX_AMS-Regular', 'Inter-400'];

/** Measures KaTeX's tree bottom up (CSS 2.2 §10: widths from content, then places). */
export class BoxMeasurer {
  constructor(
    private readonly faces: Faces,
    private readonly tex: string,
  ) {}

  measure(node: KatexNode, from: Inherited): Box | undefined {
    const meaning = classMeaning(node.classes ?? [], this.tex);
    if (node.text !== undefined) return this.symbol(node, inherit(from, meaning, node));
    const to = inherit(from, meaning, node);
    if (node.attributes?.viewBox !== undefined || node.attributes?.width !== undefined)
      return { kind: 'picture', width: 0, node, size: to.size, colour: to.colour };
    switch (meaning.role) {
      case 'nothing':
        return undefined;
      case 'line':
        return {
          kind: 'line',
          width: 0,
          thickness: em(node.style?.borderBottomWidth) * to.size,
          colour: to.colour,
        };
      case 'rule':
        return this.rule(node, to, [em(node.style?.borderTopWidth), em(node.style?.bottom)]);
      case 'separator':
        return this.rule(node, to, [em(node.style?.height), em(node.style?.verticalAlign)]);
      case 'stretch':
        return this.stretch(node, meaning, to);
      case 'stack':
        return this.stack(node, to);
      case 'lap':
        return this.lap(node, meaning, to);
      default:
        return this.row(node, meaning, to);
    }
  }

  private symbol(node: KatexNode, to: Inherited): Box {
    const glyphs: { face: Face; glyph: Glyph; x: number }[] = [];
    const main = this.faces(faceName(to));
    let width = 0;
    for (const character of node.text ?? '') {
      const codePoint = character.codePointAt(0) ?? ZERO_WIDTH_SPACE;
      if (codePoint === ZERO_WIDTH_SPACE) continue;
      const [face, glyph] = this.glyph(main, codePoint, character);
      glyphs.push({ face, glyph, x: width });
      width += glyph.advance * to.size;
    }
    const italic = Math.max(node.italic ?? 0, 0);
    const left = em(node.style?.marginLeft) * to.size;
    const right = (em(node.style?.marginRight) + italic) * to.size;
    return {
      kind: 'symbol',
      width: left + width + right,
      size: to.size,
      glyphs,
      shiftX: left + em(node.style?.left) * to.size,
      shiftY: -em(node.style?.top) * to.size,
      colour: to.colour,
    };
  }

  private glyph(main: Face, codePoint: number, character: string): [Face, Glyph] {
    const own = main.glyph(codePoint);
    if (own) return [main, own];
    for (const name of FALLBACKS) {
      const face = this.faces(name);
      const glyph = face.glyph(codePoint);
      if (glyph) return [face, glyph];
    }
    throw new TypesetError(`the character "${character}"`, this.tex);
  }

  private rule(node: KatexNode, to: Inherited, [height, rise]: readonly [number, number]): Box {
    const ruleWidth = em(node.style?.borderRightWidth) * to.size;
    // A separator's margin is written as one value for both sides, "0 -0.02em".
    const both = em(node.style?.margin?.split(' ')[1]);
    const left = (both + em(node.style?.marginLeft)) * to.size;
    return {
      kind: 'rule',
      width: left + ruleWidth + (both + em(node.style?.marginRight)) * to.size,
      ruleWidth,
      ruleHeight: height * to.size,
      shiftX: left,
      shiftY: rise * to.size,
      colour: to.colour,
    };
  }

  private stretch(node: KatexNode, meaning: ClassMeaning, to: Inherited): Box {
    const minWidth = em(node.style?.minWidth) * to.size;
    return {
      kind: 'stretch',
      width: minWidth,
      minWidth,
      height: em(node.style?.height) * to.size,
      size: to.size,
      frame: meaning.names.has('fbox'),
      parts: node.children ?? [],
      colour: node.style?.borderColor ?? to.colour,
    };
  }

  private stack(node: KatexNode, to: Inherited): Box {
    const rows = (node.children?.[0]?.children?.[0]?.children ?? []).map((row) => this.stackRow(row, to));
    const inner = Math.max(0, ...rows.map((row) => row.marginLeft + row.width + row.marginRight));
    const left = em(node.style?.marginLeft) * to.size;
    return {
      kind: 'stack',
      inner,
      width: left + inner + em(node.style?.marginRight) * to.size,
      rows,
      shiftX: left,
    };
  }

  private stackRow(row: KatexNode, from: Inherited): StackRow {
    const to = inherit(from, classMeaning(row.classes ?? [], this.tex), row);
    const strut = row.children?.find((child) => child.classes?.includes('pstrut'));
    const boxes = this.boxes(row.children ?? [], to);
    const style = row.style ?? {};
    return {
      boxes,
      width: totalWidth(boxes),
      marginLeft: (em(style.marginLeft) + em(style.paddingLeft)) * to.size,
      marginRight: em(style.marginRight) * to.size,
      y: -(em(style.top) + em(strut?.style?.height)) * to.size,
      align: to.align,
    };
  }

  private lap(node: KatexNode, meaning: ClassMeaning, to: Inherited): Box {
    const inner = node.children?.find((child) => child.classes?.includes('katex-inner'));
    const children = this.boxes(inner?.children ?? [], to);
    const width = totalWidth(children);
    const shiftX = meaning.names.has('llap') ? -width : meaning.names.has('clap') ? -width / 2 : 0;
    return { kind: 'row', width: 0, children, shiftX, shiftY: 0 };
  }

  private row(node: KatexNode, meaning: ClassMeaning, to: Inherited): Box {
    const style = node.style ?? {};
    const children = this.boxes(node.children ?? [], to);
    const left = (em(style.marginLeft) + meaning.marginLeft) * to.size;
    const right = (em(style.marginRight) + meaning.marginRight) * to.size;
    const paddingLeft = (em(style.paddingLeft) + meaning.padding) * to.size;
    const fixedWidth = style.width === undefined ? undefined : em(style.width) * to.size;
    const natural = paddingLeft + totalWidth(children) + meaning.padding * to.size;
    const content = meaning.zeroWidth ? 0 : Math.max(fixedWidth ?? natural, em(style.minWidth) * to.size);
    const nothing = meaning.role === 'null-delimiter' ? NULL_DELIMITER_WIDTH * to.size : 0;
    return {
      kind: 'row',
      width: left + Math.max(content, nothing) + right,
      children,
      shiftX: left + paddingLeft + em(style.left) * to.size,
      shiftY: -em(style.top) * to.size,
      fixedWidth,
      fixedHeight: style.height === undefined ? undefined : em(style.height) * to.size,
    };
  }

  private boxes(nodes: readonly KatexNode[], from: Inherited): Box[] {
    return nodes.map((node) => this.measure(node, from)).filter((box) => box !== undefined);
  }
}

function totalWidth(boxes: readonly Box[]): number {
  return boxes.reduce((sum, box) => sum + box.width, 0);
}

function inherit(from: Inherited, meaning: ClassMeaning, node: KatexNode): Inherited {
  return {
    family: meaning.family ?? from.family,
    bold: meaning.bold ?? from.bold,
    italic: meaning.italic ?? from.italic,
    size: from.size * meaning.scale,
    align: meaning.align ?? from.align,
    colour: node.style?.color ?? from.colour,
  };
}

/** The face a browser picks: the family with its weight and slope as far as KaTeX ships them. */
function faceName({ family, bold, italic }: Inherited): FaceName {
  if (family === 'Math') return bold ? 'KaTeX_Math-BoldItalic' : 'KaTeX_Math-Italic';
  if (family === 'Main')
    return `KaTeX_Main-${bold ? (italic ? 'BoldItalic' : 'Bold') : italic ? 'Italic' : 'Regular'}`;
  if (family === 'SansSerif') return `KaTeX_SansSerif-${bold ? 'Bold' : italic ? 'Italic' : 'Regular'}`;
  if (family === 'Caligraphic' || family === 'Fraktur') return `KaTeX_${family}-${bold ? 'Bold' : 'Regular'}`;
  return `KaTeX_${family}-Regular`;
}
