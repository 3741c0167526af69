import type { Face, FaceName, Faces, Glyph } from '@/lib/typeset/face';
import { TypesetError } from '@/lib/typeset/typeset-error';

/** Words set in one or more faces, lengths in em. `runs` follow each other along the baseline. */
export type ShapedText = {
  readonly text: string;
  readonly width: number;
  readonly runs: readonly ShapedRun[];
};

export type ShapedRun = {
  readonly text: string;
  readonly face: Face;
  readonly x: number;
  readonly glyphs: readonly Glyph[];
  readonly advances: readonly number[];
};

/** Where Inter lacks a character that calculations type in words (⋅, ∑, ∥), KaTeX's roman has it. */
const FALLBACKS: readonly FaceName[] = ['KaTeX_Main-Regular', 'KaTeX_Math-Italic', 'KaTeX_AMS-Regular'];

/**
 * Shapes words with the face's own kerning and substitutions (OpenType kern, calt, as a browser applies them).
 * Throws a TypesetError for a character that no face has: better refused than printed as an empty box.
 */
export function shapeText(text: string, name: FaceName, faces: Faces): ShapedText {
  const runs: ShapedRun[] = [];
  let x = 0;
  for (const { face, part } of splitByFace(text, name, faces)) {
    const em = face.font.unitsPerEm;
    const { glyphs, positions } = face.font.layout(part);
    const advances = positions.map((position) => position.xAdvance / em);
    runs.push({
      text: part,
      face,
      x,
      glyphs: glyphs.map((glyph) => ({ ...pick(glyph), advance: glyph.advanceWidth / em })),
      advances,
    });
    x += advances.reduce((sum, advance) => sum + advance, 0);
  }
  return { text, width: x, runs };
}

const pick = (glyph: { id: number; codePoints: number[] }) => ({
  id: glyph.id,
  codePoints: glyph.codePoints,
});

function splitByFace(text: string, name: FaceName, faces: Faces): { face: Face; part: string }[] {
  const parts: { face: Face; part: string }[] = [];
  for (const character of text) {
    const face = faceOf(character, name, faces, text);
    const last = parts.at(-1);
    if (last?.face === face) last.part += character;
    else parts.push({ face, part: character });
  }
  return parts;
}

function faceOf(character: string, name: FaceName, faces: Faces, text: string): Face {
  const codePoint = character.codePointAt(0) ?? 0;
  const found = [name, ...FALLBACKS].map(faces).find((face) => face.glyph(codePoint));
  if (!found) throw new TypesetError(`the character "${character}"`, text);
  return found;
}
