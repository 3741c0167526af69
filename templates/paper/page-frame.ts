import type { Typesetter } from '@/lib/typeset/typesetter';
import { type Imprint, imprintWords } from './imprint';
import type { Ink } from './ink';
import type { PageGeometry } from './page-geometry';
import { LOOKS, MM, type TextLook } from './paper-look';
import { wordInk } from './set-words';

export type FrameWords = {
  /** Head of the page: "S-03 Portal frame, grid 2". None on the cover. */
  readonly run?: string;
  /** Foot of the margin: "S-03.2", "cover". */
  readonly label: string;
  readonly imprint: Imprint;
  /** "13 of 31". */
  readonly place: string;
};

/** Distance between the pieces of the foot line, and the least it may shrink to, points. */
const GAP = 3.3 * MM;
const LEAST_GAP = 1.8 * MM;

/** What every page carries: the double rule over its whole height, the running head and the foot line. */
export function frameInk(words: FrameWords, page: PageGeometry, typesetter: Typesetter): Ink[] {
  const { rule, textLeft, textWidth, footLine, footBaseline } = page;
  const inner = rule.right - rule.line / 2;
  const outer = rule.right - rule.width + rule.line / 2;
  const line = (x: number): Ink => ({
    kind: 'line',
    x1: x,
    y1: 0,
    x2: x,
    y2: page.height,
    width: rule.line,
    tone: 'rose',
  });
  const ink: Ink[] = [
    line(outer),
    line(inner),
    {
      kind: 'line',
      x1: textLeft,
      y1: footLine,
      x2: textLeft + textWidth,
      y2: footLine,
      width: 0.25 * MM,
      tone: 'line2',
    },
    wordInk(
      words.label,
      LOOKS.sheetPage,
      'ink',
      { x: page.marginRight, y: footBaseline, side: 'right' },
      typesetter,
    ),
    ...footWords(words, page, typesetter),
  ];
  if (words.run) {
    ink.push(wordInk(words.run, LOOKS.run, 'ink2', { x: textLeft, y: page.runBaseline }, typesetter));
  }
  return ink;
}

function footWords({ imprint, place }: FrameWords, page: PageGeometry, typesetter: Typesetter): Ink[] {
  const { textLeft, textWidth, footBaseline } = page;
  const strong = { ...LOOKS.imprint, regular: 'Inter-600' as const };
  const pieces = [
    { text: imprint.office, look: strong, tone: 'ink' as const },
    ...imprintWords(imprint).map((text) => ({ text, look: LOOKS.imprint, tone: 'ink2' as const })),
  ];
  const end = wordInk(
    place,
    strong,
    'ink',
    { x: textLeft + textWidth, y: footBaseline, side: 'right' },
    typesetter,
  );
  const room = end.x - textLeft;
  // A long office name or many sign-offs: the gaps give way first, then the type.
  for (const [scale, gap] of [
    [1, GAP],
    [1, LEAST_GAP],
    [0.92, LEAST_GAP],
    [0.84, LEAST_GAP],
  ] as const) {
    const ink = inRow(pieces, scale, gap, page, typesetter);
    const last = ink.at(-1);
    if (!last || last.x + last.shaped.width * last.size <= textLeft + room - gap || scale === 0.84)
      return [...ink, end];
  }
  return [end];
}

function inRow(
  pieces: readonly { text: string; look: TextLook; tone: 'ink' | 'ink2' }[],
  scale: number,
  gap: number,
  page: PageGeometry,
  typesetter: Typesetter,
): (Ink & { kind: 'words' })[] {
  let x = page.textLeft;
  return pieces.map(({ text, look, tone }) => {
    const set = wordInk(
      text,
      { ...look, size: look.size * scale },
      tone,
      { x, y: page.footBaseline },
      typesetter,
    );
    x += set.shaped.width * set.size + gap;
    return { ...set, space: true };
  });
}
