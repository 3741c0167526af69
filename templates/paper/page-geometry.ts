import { MM } from './paper-look';

export type PaperSize = 'Letter' | 'A4';

/** One page in points, x right and y down from its upper left corner. */
export type PageGeometry = {
  readonly size: PaperSize;
  readonly width: number;
  readonly height: number;
  /** The double rule: its right edge, width, and the width of either line. */
  readonly rule: { readonly right: number; readonly width: number; readonly line: number };
  /** Right edge of what stands in the margin, and its left edge. */
  readonly marginRight: number;
  readonly marginLeft: number;
  readonly textLeft: number;
  readonly textWidth: number;
  /** The flow runs from `top` to `bottom`; the foot line stands at `footLine`, its words on `footBaseline`. */
  readonly top: number;
  readonly bottom: number;
  readonly runBaseline: number;
  readonly footLine: number;
  readonly footBaseline: number;
  /** Where every page is sealed: the seal's square at the margin's foot. */
  readonly marginSeal: { readonly x: number; readonly y: number; readonly size: number };
};

const PAPER = { Letter: [215.9, 279.4], A4: [210, 297] } as const;

/** Letter and A4 share every measure; only the width and the height of the text differ. */
export function pageGeometry(size: PaperSize): PageGeometry {
  const [width, height] = PAPER[size];
  const margin = 38;
  const textLeft = margin + 5.5;
  const seal = 29.6;
  return {
    size,
    width: width * MM,
    height: height * MM,
    rule: { right: margin * MM, width: 1.2 * MM, line: 0.3 * MM },
    marginRight: (margin - 5) * MM,
    marginLeft: 6 * MM,
    textLeft: textLeft * MM,
    textWidth: (width - textLeft - 16) * MM,
    top: 19 * MM,
    bottom: (height - 15 - 3.5) * MM,
    runBaseline: 14 * MM,
    footLine: (height - 14.4) * MM,
    footBaseline: (height - 9.2) * MM,
    marginSeal: { x: 3.6 * MM, y: (height - 24.5 - seal) * MM, size: seal * MM },
  };
}
