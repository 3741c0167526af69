/** The part of fontkit 2.0.4 that typesetting and the PDF writer use; the package ships no types of its own. */
declare module 'fontkit' {
  export interface FontkitGlyph {
    readonly id: number;
    readonly advanceWidth: number;
    readonly codePoints: number[];
  }
  export interface FontkitRun {
    readonly glyphs: FontkitGlyph[];
    readonly positions: { xAdvance: number; xOffset: number; yOffset: number }[];
  }
  export interface FontkitFont {
    readonly postscriptName: string;
    readonly unitsPerEm: number;
    readonly ascent: number;
    readonly descent: number;
    hasGlyphForCodePoint(codePoint: number): boolean;
    glyphForCodePoint(codePoint: number): FontkitGlyph;
    layout(text: string): FontkitRun;
  }
  export function create(bytes: Uint8Array): FontkitFont;
}
