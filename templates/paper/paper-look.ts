import type { Tone } from '@/lib/figures/drawing';
import type { RichStyle } from '@/lib/typeset/rich-line';

/** Points in a millimetre. */
export const MM = 72 / 25.4;

/** Inks of the printed page, by what they are for; all but the rose of the margin rule keep 4.5:1 on white. */
export const COLOURS = {
  ink: '#15213B',
  ink2: '#43516B',
  ink3: '#5C6A82',
  pen: '#1C4E9D',
  ochre: '#8A5000',
  tick: '#1E6A4D',
  violet: '#5B478F',
  seal: '#B4231B',
  edge: '#7C8A9E',
  rose: '#C58A95',
  hairline: '#C9D3DE',
  line2: '#B9C4D0',
  grid: '#DCE6F0',
  wash: '#E8EFF9',
  paper: '#FFFFFF',
} as const satisfies Record<Tone, string> & Record<string, string>;

export type PaperTone = keyof typeof COLOURS;

/** A piece of running text: its type, and the distance between baselines, points. */
export type TextLook = RichStyle & { readonly leading: number };

const words = (size: number, leading: number): TextLook => ({
  size,
  leading,
  regular: 'Inter-400',
  bold: 'Inter-600',
});
const strong = (size: number, leading: number): TextLook => ({
  ...words(size, leading),
  regular: 'Inter-600',
});

export const LOOKS = {
  text: words(9.4, 13.6),
  heading: strong(11.5, 14),
  headingAgain: words(11.5, 14),
  caption: words(8, 11),
  table: words(8.6, 12.4),
  tableTotal: strong(8.6, 12.4),
  tableHead: words(8.2, 11),
  number: words(8.8, 13.6),
  headingNumber: strong(11.5, 14),
  source: words(7.4, 9.6),
  run: words(8, 10),
  imprint: words(7.2, 10),
  sheetPage: strong(8.8, 10),
  small: words(7.4, 10.2),
} as const;

/** Where Inter's baseline lies under the top of a line: its ascent 0.969 and descent 0.242 em centred in the leading. */
export function baseline(look: Pick<TextLook, 'size' | 'leading'>): number {
  return look.leading / 2 + 0.3637 * look.size;
}
