import type { Drawing } from '@/lib/figures/drawing';
import type { Laid } from '@/lib/typeset/laid';
import type { ShapedText } from '@/lib/typeset/shape-text';
import type { PaperTone } from './paper-look';

/** A mark on a page or in a part of one: points, y down. Words and formulas stand with their baseline at y. */
export type Ink =
  | {
      readonly kind: 'words';
      readonly x: number;
      readonly y: number;
      readonly size: number;
      readonly shaped: ShapedText;
      readonly tone: PaperTone;
      readonly tracking?: number;
      /** A space follows on the line: written into the file, so that copied words do not run together. */
      readonly space?: boolean;
    }
  | {
      readonly kind: 'math';
      readonly x: number;
      readonly y: number;
      readonly size: number;
      readonly laid: Laid;
      readonly tex: string;
      readonly tone: PaperTone;
    }
  | {
      readonly kind: 'line';
      readonly x1: number;
      readonly y1: number;
      readonly x2: number;
      readonly y2: number;
      readonly width: number;
      readonly tone: PaperTone;
      readonly dash?: readonly number[];
    }
  | {
      readonly kind: 'fill';
      readonly x: number;
      readonly y: number;
      readonly width: number;
      readonly height: number;
      readonly tone: PaperTone;
    }
  | {
      readonly kind: 'drawing';
      readonly x: number;
      readonly y: number;
      readonly scale: number;
      readonly drawing: Drawing;
    }
  | {
      /** SVG path data of M, L, C and Z, stroked; its own units are points. */
      readonly kind: 'stroke';
      readonly x: number;
      readonly y: number;
      readonly d: string;
      readonly width: number;
      readonly tone: PaperTone;
      readonly dash?: readonly number[];
    }
  | {
      /** A place to go to: a page of this document by the name of its destination. */
      readonly kind: 'link';
      readonly x: number;
      readonly y: number;
      readonly width: number;
      readonly height: number;
      readonly to: string;
    };

/** The same ink moved by (dx, dy). */
export function moved(ink: Ink, dx: number, dy: number): Ink {
  if (ink.kind === 'line')
    return { ...ink, x1: ink.x1 + dx, x2: ink.x2 + dx, y1: ink.y1 + dy, y2: ink.y2 + dy };
  return { ...ink, x: ink.x + dx, y: ink.y + dy };
}
