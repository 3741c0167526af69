import type { Typesetter } from '@/lib/typeset/typesetter';
import { CAUTIONS_SHORT } from './cautions';
import { MODE_WORDS } from './imprint';
import { type Ink, moved } from './ink';
import { deltaIcon } from './mark-icons';
import type { PackagePrint, Person } from './package-print';
import type { PageGeometry } from './page-geometry';
import { baseline, LOOKS, MM, type TextLook } from './paper-look';
import { setLines, wordInk } from './set-words';
import { LIST_HEAD, LIST_ROW, listHead, listRow } from './sheet-list';
import { stackLines } from './stack-lines';

export type CoverEntry = Parameters<typeof listRow>[0];

const OFFICE: TextLook = { ...LOOKS.text, size: 10, leading: 14, regular: 'Inter-600' };
const TITLE: TextLook = { ...LOOKS.text, size: 31, leading: 36, regular: 'Inter-500', tracking: -0.028 };
const SUBTITLE: TextLook = { ...LOOKS.text, size: 15, leading: 21 };
const FACT: TextLook = { ...LOOKS.text, size: 9.6, leading: 14 };
const PEOPLE: TextLook = { ...LOOKS.text, size: 8.6, leading: 13 };
const SEAL = 40 * MM;
/** Width of the seal's column at the right, and the foot of the cover's own matter above the page's. */
const SEAL_COLUMN = 46 * MM;
const FOOT = 21 * MM;

/** The square of the cover's seal: x and y of its upper left corner. */
export function coverSeal(page: PageGeometry): { x: number; y: number; size: number } {
  const centre = page.textLeft + page.textWidth - SEAL_COLUMN / 2;
  return {
    x: centre - SEAL / 2,
    y: page.height - FOOT - 2 * LOOKS.small.leading - 2 * MM - SEAL,
    size: SEAL,
  };
}

/** The cover: the office leads; title, place, authority, purpose; the sheets; people; the seal's place. */
export function setCover(
  print: PackagePrint,
  entries: readonly CoverEntry[],
  page: PageGeometry,
  typesetter: Typesetter,
): Ink[] {
  const top = 16 * MM + baseline(OFFICE);
  const ink: Ink[] = [
    wordInk(print.job.number, OFFICE, 'ink', { x: page.marginRight, y: top, side: 'right' }, typesetter),
    wordInk(print.office, OFFICE, 'ink', { x: page.textLeft, y: top }, typesetter),
  ];
  let y = 51 * MM;
  const add = (text: string, look: TextLook, tone: 'ink' | 'ink2') => {
    const set = stackLines(setLines(text, look, tone, page.textWidth, typesetter), page.textLeft, y);
    ink.push(...set.ink);
    y += set.height;
  };
  add(print.job.title, TITLE, 'ink');
  y += 2.5 * MM;
  add('Structural calculations', SUBTITLE, 'ink');
  add(print.purpose, SUBTITLE, 'ink2');
  y += 12 * MM;
  for (const [name, value] of facts(print)) {
    ink.push(
      wordInk(name, FACT, 'ink2', { x: page.marginRight, y: y + baseline(FACT), side: 'right' }, typesetter),
    );
    add(value, FACT, 'ink');
    y += 1.4 * MM;
  }
  ink.push(...foot(print, page, typesetter));
  ink.push(...list(entries, y + 10 * MM, page, typesetter));
  return ink;
}

function facts({ job }: PackagePrint): [string, string][] {
  const rows: [string, string | undefined][] = [
    ['place', job.place],
    ['for', job.client],
    ['to', job.authority],
    ['codes', job.codes?.join(', ')],
  ];
  return rows.filter((row): row is [string, string] => row[1] !== undefined && row[1] !== '');
}

/** The list of sheets as far as the cover has room; the index has them all. */
function list(
  entries: readonly CoverEntry[],
  top: number,
  page: PageGeometry,
  typesetter: Typesetter,
): Ink[] {
  const room = coverSeal(page).y - 8 * MM - top - LIST_HEAD;
  const fitting = Math.floor(room / LIST_ROW);
  const shown = entries.length <= fitting ? entries : entries.slice(0, Math.max(0, fitting - 1));
  const ink = listHead(page, top, typesetter);
  let y = top + LIST_HEAD;
  for (const entry of shown) {
    ink.push(...listRow(entry, page, y, typesetter));
    y += LIST_ROW;
  }
  const more = entries.length - shown.length;
  if (more > 0) {
    const at = { x: page.textLeft, y: y + 4.7 * MM };
    ink.push(wordInk(`and ${more} more: see the index on page 2`, LOOKS.text, 'ink2', at, typesetter));
  }
  return ink;
}

function foot(print: PackagePrint, page: PageGeometry, typesetter: Typesetter): Ink[] {
  const width = page.textWidth - SEAL_COLUMN - 7 * MM;
  const bottom = page.height - FOOT;
  const cautions = setLines(CAUTIONS_SHORT, LOOKS.small, 'ink2', width, typesetter);
  const cautionsTop = bottom - cautions.length * LOOKS.small.leading;
  const ink = stackLines(cautions, page.textLeft, cautionsTop).ink;
  const rows = people(print);
  let y = cautionsTop - 3.5 * MM;
  for (const [role, names] of rows.reverse()) {
    const set = stackLines(setLines(names, PEOPLE, 'ink', width - 29 * MM, typesetter));
    y -= set.height;
    ink.push(...set.ink.map((mark) => moved(mark, page.textLeft + 29 * MM, y)));
    ink.push(wordInk(role, PEOPLE, 'ink2', { x: page.textLeft, y: y + baseline(PEOPLE) }, typesetter));
  }
  return [...ink, ...sealArea(print, page, typesetter), ...changeLegend(print, page, typesetter)];
}

function people({ people: { originators, checkers, engineer } }: PackagePrint): [string, string][] {
  const named = (list: readonly Person[]) =>
    list.map(({ name, initials }) => `${name} **${initials}**`).join(', ');
  const rows: [string, string][] = [
    [originators.length === 1 ? 'originator' : 'originators', named(originators)],
    [checkers.length === 1 ? 'checker' : 'checkers', named(checkers)],
    ['engineer of record', engineer ? named([engineer]) : ''],
  ];
  return rows.filter(([, names]) => names !== '');
}

function sealArea({ mode, seal }: PackagePrint, page: PageGeometry, typesetter: Typesetter): Ink[] {
  const place = coverSeal(page);
  const centre = place.x + SEAL / 2;
  const words = [seal && `covers ${seal.covers}`, MODE_WORDS[mode]].filter((text) => text !== undefined);
  const under = words.map((text, index) => {
    const y = place.y + SEAL + 2 * MM + baseline(LOOKS.small) + index * LOOKS.small.leading;
    return wordInk(text, LOOKS.small, 'ink2', { x: centre, y, side: 'centre' }, typesetter);
  });
  if (!seal || mode === 'final') return under;
  // Four cubic arcs a circle; 0.5523 is the usual handle length for an arc of 90 degrees.
  const r = SEAL / 2;
  const k = 0.5523 * r;
  const d = `M0 ${-r}C${k} ${-r} ${r} ${-k} ${r} 0C${r} ${k} ${k} ${r} 0 ${r}C${-k} ${r} ${-r} ${k} ${-r} 0C${-r} ${-k} ${-k} ${-r} 0 ${-r}Z`;
  return [
    { kind: 'stroke', x: centre, y: place.y + r, d, width: 0.3 * MM, tone: 'edge', dash: [3, 2.2] },
    wordInk('Seal', PEOPLE, 'ink3', { x: centre, y: place.y + r + 3, side: 'centre' }, typesetter),
    ...under,
  ];
}

/** What the triangles of the list mean. */
function changeLegend({ sheets, previous }: PackagePrint, page: PageGeometry, typesetter: Typesetter): Ink[] {
  const changed = sheets.find(({ since }) => since === 'changed');
  if (!changed || previous === undefined) return [];
  const bottom = page.height - FOOT;
  const word = (text: string, y: number) =>
    wordInk(text, LOOKS.small, 'ink2', { x: page.marginRight, y, side: 'right' }, typesetter);
  return [
    ...deltaIcon(changed.revision, page.marginRight, bottom - 26, typesetter),
    word('changed since', bottom - 13.2),
    word(`submittal ${previous}`, bottom - 3),
  ];
}
