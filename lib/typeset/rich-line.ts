import type { FaceName } from '@/lib/typeset/face';
import type { Laid } from '@/lib/typeset/laid';
import type { ShapedText } from '@/lib/typeset/shape-text';

/** Words or a formula at its place on a line; `x` and `size` in points. */
export type RichItem =
  | {
      readonly kind: 'words';
      readonly x: number;
      readonly size: number;
      readonly width: number;
      readonly shaped: ShapedText;
    }
  | {
      readonly kind: 'math';
      readonly x: number;
      readonly size: number;
      readonly width: number;
      readonly laid: Laid;
      readonly tex: string;
    };

/** One line of set rich text, in points; `height` and `depth` are its reach above and below the baseline. */
export type RichLine = {
  readonly items: readonly RichItem[];
  readonly width: number;
  readonly height: number;
  readonly depth: number;
};

/** Type of a piece of rich text. */
export type RichStyle = {
  /** Of the words, points. */
  readonly size: number;
  readonly regular: FaceName;
  readonly bold: FaceName;
  /** Letter spacing, em. */
  readonly tracking?: number;
};

/** KaTeX's faces look as large as Inter beside them at this factor; the screen's style sheet uses the same. */
export const MATH_SCALE = 1.13;
