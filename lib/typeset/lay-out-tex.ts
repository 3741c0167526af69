import type { Faces } from '@/lib/typeset/face';
import { katexBases } from '@/lib/typeset/katex-tree';
import type { GlyphMark, Laid, Mark } from '@/lib/typeset/laid';
import { BoxMeasurer, ROOT } from '@/lib/typeset/measure-box';
import { placeBox } from '@/lib/typeset/place-box';

/** Two glyphs join into one run when the second starts where the first ends, within this many em. */
const JOIN = 1e-6;

/**
 * Lays out TeX exactly as KaTeX's HTML shows it in a browser; lengths in em of the size it will be drawn at.
 * `display` is TeX's display style; otherwise text style, as inline in a sentence.
 * Throws a TypesetError naming what it cannot set.
 */
export function layOutTex(tex: string, display: boolean, faces: Faces): Laid {
  const measurer = new BoxMeasurer(faces, tex);
  const marks: Mark[] = [];
  let width = 0;
  let height = 0;
  let depth = 0;
  for (const base of katexBases(tex, display)) {
    height = Math.max(height, base.height ?? 0);
    depth = Math.max(depth, base.depth ?? 0);
    const box = measurer.measure(base, ROOT);
    if (!box) continue;
    placeBox(box, width, 0, box.width, marks);
    width += box.width;
  }
  return { width, height, depth, marks: joinRuns(marks) };
}

function joinRuns(marks: readonly Mark[]): Mark[] {
  const joined: Mark[] = [];
  let run: GlyphMark | undefined;
  let place = 0;
  let end = 0;
  for (const mark of marks) {
    if (mark.kind !== 'glyphs') {
      joined.push(mark);
      continue;
    }
    if (run && continues(run, end, mark)) {
      run = {
        ...run,
        glyphs: [...run.glyphs, ...mark.glyphs],
        advances: [...run.advances, ...mark.advances],
      };
      joined[place] = run;
    } else {
      run = mark;
      place = joined.push(run) - 1;
    }
    end = mark.x + mark.advances.reduce((sum, advance) => sum + advance, 0) * mark.size;
  }
  return joined;
}

function continues(run: GlyphMark, end: number, next: GlyphMark): boolean {
  return (
    run.face === next.face &&
    run.size === next.size &&
    run.colour === next.colour &&
    run.y === next.y &&
    Math.abs(next.x - end) < JOIN
  );
}
