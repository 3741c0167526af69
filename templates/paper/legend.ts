import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Ink } from './ink';
import type { LineMarks } from './margin-note';
import { crossIcon, deltaIcon, queryIcon, tickIcon } from './mark-icons';
import type { PageGeometry } from './page-geometry';
import { LOOKS, MM } from './paper-look';
import { wordInk } from './set-words';

const LEADING = 11;
const BASE = 4.6 * MM;

type Marked = { readonly marks?: Readonly<Record<string, LineMarks>>; readonly markedBy?: string };

/** What the marks mean, at the margin's foot, above the seal: those that the sheet bears, each with its shape. */
export function legendInk(
  { marks, markedBy }: Marked,
  page: PageGeometry,
  sealed: boolean,
  typesetter: Typesetter,
): { ink: Ink[]; height: number } {
  const all = Object.values(marks ?? {});
  const by = markedBy ? `, ${markedBy}` : '';
  const entries: [string, (x: number, y: number) => Ink[]][] = [];
  if (all.some(({ mark }) => mark === 'agrees'))
    entries.push([`agrees${by}`, (x, y) => tickIcon(x - 8.4, y)]);
  if (all.some(({ mark }) => mark === 'correct'))
    entries.push([`correct this${by}`, (x, y) => crossIcon(x - 7, y)]);
  if (all.some(({ mark }) => mark === 'query')) entries.push([`query${by}`, (x, y) => queryIcon(x - 6, y)]);
  for (const revision of [...new Set(all.flatMap(({ changedIn }) => changedIn ?? []))].sort(
    (a, b) => a - b,
  )) {
    entries.push([`changed in rev ${revision}`, (x, y) => deltaIcon(revision, x, y, typesetter)]);
  }
  if (entries.length === 0) return { ink: [], height: 0 };
  const foot = sealed ? page.marginSeal.y - 2 * MM : page.footLine - BASE;
  const ink = entries.flatMap(([text, icon], index) => {
    const y = foot - (entries.length - 1 - index) * LEADING;
    const words = wordInk(text, LOOKS.source, 'ink2', { x: page.marginRight, y, side: 'right' }, typesetter);
    return [words, ...icon(words.x - 3, y)];
  });
  const height = (sealed ? 0 : page.bottom - page.footLine + BASE) + entries.length * LEADING + 2 * MM;
  return { ink, height };
}
