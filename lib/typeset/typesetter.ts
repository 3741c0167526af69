import type { FaceName, Faces } from '@/lib/typeset/face';
import type { Laid } from '@/lib/typeset/laid';
import { layOutTex } from '@/lib/typeset/lay-out-tex';
import { type ShapedText, shapeText } from '@/lib/typeset/shape-text';

/** Sets TeX and words, remembering what it set: a sheet repeats its symbols and words many times over. */
export type Typesetter = {
  /** See layOutTex. */
  tex(source: string, display: boolean): Laid;
  /** See shapeText. */
  text(source: string, face: FaceName): ShapedText;
};

/** Entries kept before a cache starts anew; a long package has a few thousand formulas. */
const KEPT = 20_000;

export function createTypesetter(faces: Faces): Typesetter {
  const formulas = new Map<string, Laid>();
  const words = new Map<string, ShapedText>();
  return {
    tex: (source, display) =>
      remember(formulas, `${display ? 'D' : 'T'}${source}`, () => layOutTex(source, display, faces)),
    text: (source, face) => remember(words, `${face} ${source}`, () => shapeText(source, face, faces)),
  };
}

function remember<T>(cache: Map<string, T>, key: string, make: () => T): T {
  const known = cache.get(key);
  if (known !== undefined) return known;
  const made = make();
  if (cache.size >= KEPT) cache.clear();
  cache.set(key, made);
  return made;
}
