import { create, type FontkitFont } from 'fontkit';

/** "Inter-400", "Inter-500", "Inter-600", or a KaTeX face by its file name without ending: "KaTeX_Main-Regular". */
export type FaceName = `Inter-${400 | 500 | 600}` | `KaTeX_${string}`;

/** One glyph of a face; `advance` in em. */
export type Glyph = { readonly id: number; readonly advance: number; readonly codePoints: readonly number[] };

/** An opened font with the metrics that layout needs, all in em. `ascent` above and `descent` below are positive. */
export type Face = {
  readonly name: FaceName;
  readonly font: FontkitFont;
  readonly ascent: number;
  readonly descent: number;
  /** The glyph of a character, or undefined where the face lacks it. */
  glyph(codePoint: number): Glyph | undefined;
};

/** Opens a face at first use and keeps it. */
export type Faces = (name: FaceName) => Face;

/** Faces from the bytes of their TrueType files; `read` is the only thing that knows where those lie. */
export function openFaces(read: (name: FaceName) => Uint8Array): Faces {
  const opened = new Map<FaceName, Face>();
  return (name) => {
    let face = opened.get(name);
    if (!face) {
      face = openFace(name, create(read(name)));
      opened.set(name, face);
    }
    return face;
  };
}

function openFace(name: FaceName, font: FontkitFont): Face {
  const em = font.unitsPerEm;
  const glyphs = new Map<number, Glyph | undefined>();
  return {
    name,
    font,
    ascent: font.ascent / em,
    descent: -font.descent / em,
    glyph(codePoint) {
      if (glyphs.has(codePoint)) return glyphs.get(codePoint);
      const found = font.hasGlyphForCodePoint(codePoint) ? font.glyphForCodePoint(codePoint) : undefined;
      const glyph = found && { id: found.id, advance: found.advanceWidth / em, codePoints: [codePoint] };
      glyphs.set(codePoint, glyph);
      return glyph;
    },
  };
}
