import type { Face, Glyph } from '@/lib/typeset/face';
import type { Align } from '@/lib/typeset/katex-class';
import type { KatexNode } from '@/lib/typeset/katex-tree';

/** A measured node, lengths in em of the whole formula. Widths are known; places are not yet. */
export type Box =
  | {
      readonly kind: 'symbol';
      readonly width: number;
      readonly size: number;
      readonly glyphs: readonly { readonly face: Face; readonly glyph: Glyph; readonly x: number }[];
      readonly shiftX: number;
      readonly shiftY: number;
      readonly colour?: string;
    }
  | {
      readonly kind: 'row';
      readonly width: number;
      readonly children: readonly Box[];
      readonly shiftX: number;
      readonly shiftY: number;
      /** Set where the style fixes them; a picture inside fills them. */
      readonly fixedWidth?: number;
      readonly fixedHeight?: number;
    }
  | {
      readonly kind: 'stack';
      readonly width: number;
      readonly inner: number;
      readonly rows: readonly StackRow[];
      readonly shiftX: number;
    }
  | {
      readonly kind: 'line';
      readonly width: 0;
      readonly thickness: number;
      readonly colour?: string;
    }
  | {
      readonly kind: 'rule';
      readonly width: number;
      readonly ruleWidth: number;
      readonly ruleHeight: number;
      readonly shiftX: number;
      readonly shiftY: number;
      readonly colour?: string;
    }
  | {
      readonly kind: 'stretch';
      readonly width: number;
      readonly minWidth: number;
      readonly height: number;
      readonly size: number;
      readonly frame: boolean;
      readonly parts: readonly KatexNode[];
      readonly colour?: string;
    }
  | {
      readonly kind: 'picture';
      readonly width: 0;
      readonly node: KatexNode;
      readonly size: number;
      readonly colour?: string;
    };

/** One row of a stack, `y` above the stack's own baseline. */
export type StackRow = {
  readonly boxes: readonly Box[];
  readonly width: number;
  readonly marginLeft: number;
  readonly marginRight: number;
  readonly y: number;
  readonly align: Align;
};
