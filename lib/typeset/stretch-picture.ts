import { em, type KatexNode } from '@/lib/typeset/katex-tree';
import type { Mark } from '@/lib/typeset/laid';

type Picture = { readonly node: KatexNode; readonly size: number; readonly colour?: string };
type Frame = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

/** Pictures drawn far wider than they show (surds, braces, arrows) are cut at their frame. */
const CUT_FROM = 40_000;

/** Fits one of KaTeX's SVG pictures into a frame whose lower left corner is (x, y), as SVG 1.1 §7.8 does. */
export function stretchPicture({ node, size, colour }: Picture, frame: Frame, out: Mark[]): void {
  for (const child of node.children ?? []) {
    if (child.attributes?.x1 !== undefined) out.push(stroke(child.attributes, size, colour, frame));
    else out.push(outline(node, child, colour, frame));
  }
}

function stroke(
  attributes: Readonly<Record<string, string | undefined>>,
  size: number,
  colour: string | undefined,
  frame: Frame,
): Mark {
  const along = (value: string | undefined, length: number) =>
    value?.endsWith('%') ? (Number.parseFloat(value) / 100) * length : em(value) * size;
  const top = frame.y + frame.height;
  return {
    kind: 'stroke',
    x1: frame.x + along(attributes.x1, frame.width),
    y1: top - along(attributes.y1, frame.height),
    x2: frame.x + along(attributes.x2, frame.width),
    y2: top - along(attributes.y2, frame.height),
    thickness: em(attributes['stroke-width']) * size,
    colour,
  };
}

function outline(node: KatexNode, path: KatexNode, colour: string | undefined, frame: Frame): Mark {
  const [, , viewWidth = 1, viewHeight = 1] = (node.attributes?.viewBox ?? '').split(' ').map(Number);
  const fit = node.attributes?.preserveAspectRatio ?? 'xMinYMin slice';
  const uniform = frame.height / viewHeight;
  const free = fit === 'none' ? false : viewWidth * uniform > frame.width;
  const excess = free ? frame.width - viewWidth * uniform : 0;
  const shift = fit.startsWith('xMid') ? excess / 2 : fit.startsWith('xMax') ? excess : 0;
  return {
    kind: 'path',
    d: pathData(path),
    x: frame.x + shift,
    y: frame.y + frame.height,
    scaleX: fit === 'none' ? frame.width / viewWidth : uniform,
    scaleY: uniform,
    clip: fit !== 'none' && viewWidth > CUT_FROM ? frame : undefined,
    colour,
  };
}

const data = new Map<string, string>();

/** The `d` of a path node; KaTeX keeps it behind a name and writes it only into markup. */
function pathData(path: KatexNode): string {
  const key = path.alternate || path.pathName;
  const known = key === undefined ? undefined : data.get(key);
  if (known !== undefined) return known;
  const d = /\sd=["']([^"']*)["']/.exec(path.toMarkup())?.[1] ?? '';
  if (key !== undefined) data.set(key, d);
  return d;
}
