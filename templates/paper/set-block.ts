import { TypesetError } from '@/lib/typeset/typeset-error';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Block } from '../block';
import { type Ink, moved } from './ink';
import { type LineMarks, marginNote } from './margin-note';
import type { PageGeometry } from './page-geometry';
import { PaperError } from './paper-error';
import { baseline, LOOKS, MM } from './paper-look';
import { setEquation } from './set-equations';
import { setFigure } from './set-figure';
import { setTable } from './set-table';
import { setLines } from './set-words';
import { lineStrips, plainStrip, stackLines } from './stack-lines';
import type { Strip } from './strip';

/** What every block of a sheet is set with. */
export type Setting = {
  readonly page: PageGeometry;
  /** Width of the left-hand sides, see equalsColumn. */
  readonly column: number;
  readonly typesetter: Typesetter;
};

const BETWEEN = 2.6 * MM;
/** Space above a section's heading, and the least that must follow it on its page. */
const ABOVE_HEADING = 7.6 * MM;
/** Below a heading that goes on from the last page, where no line's own space follows. */
const BELOW_AGAIN = 2.2 * MM;
/** Between the sentence that leads in and the first equation. */
const BELOW_LEAD = 0.5 * MM;
/** Room between the ends of two margin notes. */
const NOTE_GAP = 1.2 * MM;

/** A block as strips with its number, source and marks in the margin. Throws a PaperError naming the block. */
export function setBlock(block: Block, marks: LineMarks | undefined, setting: Setting): Strip[] {
  try {
    return withNote(block, marks, body(block, setting), setting);
  } catch (cause) {
    if (!(cause instanceof TypesetError)) throw cause;
    throw new PaperError('cannot-set', block.id, cause.message, { cause });
  }
}

function body(block: Block, { page, column, typesetter }: Setting): Strip[] {
  const { textWidth } = page;
  switch (block.kind) {
    case 'heading':
      return [setHeading(block.id, block.text, page, typesetter)];
    case 'paragraph':
      return lineStrips(block.id, setLines(block.text, LOOKS.text, 'ink', textWidth, typesetter), false);
    case 'caution': {
      const bar = 4 * MM;
      const { ink, height } = stackLines(
        setLines(block.text, LOOKS.text, 'ink', textWidth - bar, typesetter),
        bar,
      );
      ink.push({
        kind: 'line',
        x1: 0.4 * MM,
        y1: 0,
        x2: 0.4 * MM,
        y2: height,
        width: 0.5 * MM,
        tone: 'edge',
      });
      return [plainStrip(block.id, height, ink)];
    }
    case 'equations': {
      const lead =
        block.text === undefined ? [] : setLines(block.text, LOOKS.text, 'ink', textWidth, typesetter);
      const rows = block.rows.map((row) => setEquation(row, block.id, column, textWidth, typesetter));
      const [first, ...more] = rows;
      if (!first || lead.length === 0) return rows;
      return [...lineStrips(block.id, lead, true), { ...first, before: BELOW_LEAD }, ...more];
    }
    case 'table':
      return setTable(block, page, typesetter);
    case 'figure':
      return [setFigure(block, page, page.bottom - page.top - 12 * MM, typesetter)];
  }
}

function setHeading(id: string, text: string, page: PageGeometry, typesetter: Typesetter): Strip {
  const bold = (words: string) => `**${words.replaceAll('**', '')}**`;
  const set = (rich: string, more: Partial<Strip> = {}): Strip => {
    const { ink, height } = stackLines(setLines(rich, LOOKS.headingAgain, 'ink', page.textWidth, typesetter));
    return plainStrip(id, height, ink, { keep: true, ...more });
  };
  const again = set(`${bold(text)} continued`);
  const note = marginNote({ id, heading: true }, baseline(LOOKS.headingAgain), page, typesetter);
  return set(bold(text), {
    again: {
      ...again,
      height: again.height + BELOW_AGAIN,
      ink: [...again.ink, ...note.ink],
      noteHeight: note.height,
    },
  });
}

function withNote(block: Block, marks: LineMarks | undefined, strips: Strip[], setting: Setting): Strip[] {
  const [first, ...rest] = strips;
  if (!first) return [];
  const heading = block.kind === 'heading';
  const source = 'source' in block ? block.source : undefined;
  const base = firstBaseline(first.ink, heading);
  const note = marginNote({ id: block.id, source, marks, heading }, base, setting.page, setting.typesetter);
  const before = heading ? ABOVE_HEADING : BETWEEN;
  const noted = { ...first, before, ink: [...first.ink, ...note.ink], noteHeight: note.height };
  const all = [noted, ...rest];
  // A note longer than its line pushes the next line down: notes never run into each other.
  const lack = note.height + NOTE_GAP - BETWEEN - all.reduce((sum, strip) => sum + strip.height, 0);
  const last = all.at(-1);
  if (lack > 0 && last) all[all.length - 1] = { ...last, height: last.height + lack };
  return all;
}

/** Where the number stands: on the baseline of the first words; beside a figure, near its top. */
function firstBaseline(ink: readonly Ink[], heading: boolean): number {
  const mark = ink.find((item) => (item.kind === 'words' || item.kind === 'math') && item.x >= 0);
  if (ink[0]?.kind === 'drawing' || !mark || !('y' in mark))
    return baseline(heading ? LOOKS.headingAgain : LOOKS.text);
  return mark.y;
}

/** Strip ink at its place on a page. */
export function placed(strip: Strip, page: PageGeometry, y: number): Ink[] {
  return strip.ink.map((mark) => moved(mark, page.textLeft, y));
}
