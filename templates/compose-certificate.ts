import { categorySource, categoryWords } from '@/lib/model/independence';
import type { Block, TableRow } from './block';
import type { LineMarks } from './paper/margin-note';
import { plain } from './plain-text';
import { writeDifference, writeValue } from './write-pair';

/** Everything that the record holds of one check. Times are written already. */
export interface CertifiedCheck {
  sheet: string;
  title: string;
  revision: number;
  digest: string;
  originator: string;
  frozen: string;
  checker: string;
  /** Of the checker, when it is another than the office. */
  organisation: string;
  category: number;
  standardSolution: string;
  blind: boolean;
  given: string;
  /** "agreed 1 Dec 2026", or that it is open, returned or void. */
  standing: string;
  note: string;
  declaration: string;
  lines: number;
  marks: readonly CertifiedMark[];
  inputs: readonly { place: string; value: string; mark?: string; drawing?: string }[];
  comparison?: {
    own: string;
    at: string;
    pairs: readonly { name: string; unit: string; before?: number; after?: number; change?: number }[];
  };
}

export interface CertifiedMark {
  place: 'line' | 'input' | 'basis';
  where: string;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  drawing: string;
  /** In a word: open, answered, accepted … */
  state: string;
  steps: readonly { word: string; text: string; by: string; at: string }[];
}

export interface Certificate {
  blocks: Block[];
  /** Shapes in the margin, by line. */
  marks: Record<string, LineMarks>;
}

const kinds = { agrees: 'agrees', correct: 'correct this', query: 'query' } as const;

/** The certificate of one check and its schedule of marks and queries, as a paper of its own. */
export function composeCertificate(check: CertifiedCheck): Certificate {
  const parts = [
    { title: 'Certificate', make: certificate },
    { title: 'Marks and queries', make: schedule },
    { title: 'Inputs against drawings', make: inputs },
    { title: 'Values side by side', make: comparison },
  ];
  const whole: Certificate = { blocks: [], marks: {} };
  let section = 0;
  for (const { title, make } of parts) {
    const lines = make(check);
    if (lines.length === 0) continue;
    section++;
    whole.blocks.push({ kind: 'heading', id: `${section}`, text: title });
    add(whole, `${section}`, lines, 1);
  }
  return whole;
}

/** The checks of all sheets of a package under one heading, on its last pages. */
export function composeChecks(checks: readonly CertifiedCheck[]): Certificate {
  const whole: Certificate = { blocks: [], marks: {} };
  if (checks.length === 0) return whole;
  whole.blocks.push({ kind: 'heading', id: 'K', text: 'Checks of the sheets' });
  let next = 1;
  for (const check of checks)
    next = add(
      whole,
      'K',
      [certificate, schedule, inputs, comparison].flatMap((make) => make(check)),
      next,
    );
  return whole;
}

/** A block without its number yet, and the mark in its margin. */
type Line = { block: (id: string) => Block; mark?: LineMarks };

function add(whole: Certificate, section: string, lines: readonly Line[], from: number): number {
  lines.forEach(({ block, mark }, i) => {
    const id = `${section}.${from + i}`;
    whole.blocks.push(block(id));
    if (mark) whole.marks[id] = mark;
  });
  return from + lines.length;
}

const paragraph = (text: string, mark?: LineMarks): Line => ({
  block: (id) => ({ kind: 'paragraph', id, text }),
  ...(mark ? { mark } : {}),
});

function table(caption: string, heads: readonly string[], rows: readonly TableRow[], right = 0): Line {
  const columns = heads.map((head, i) => ({
    head,
    align: i >= heads.length - right ? ('right' as const) : ('left' as const),
  }));
  return { block: (id) => ({ kind: 'table', id, caption, columns, rows: [...rows] }) };
}

function certificate(c: CertifiedCheck): Line[] {
  const atLines = c.marks.filter((m) => m.place === 'line').length;
  const held = c.inputs.filter((i) => i.mark).length;
  const facts: [string, string][] = [
    ['sheet', `${c.sheet} ${c.title}, revision ${c.revision}`],
    ['digest, SHA-256', c.digest.replace(/(.{16})(?=.)/g, '$1 ')],
    ['originator', `${c.originator}, frozen ${c.frozen}`],
    ['checker', [c.checker, c.organisation].filter(Boolean).join(', ')],
    ['independence', `${categoryWords(c.category)} (${categorySource})`],
    ...(c.standardSolution === '' ? [] : [['standard solution', c.standardSolution] as [string, string]]),
    [
      'method',
      c.blind ? 'own derivation, without the designer’s sheet; then compared' : 'line by line at the sheet',
    ],
    ['given to the checker', c.given],
    ['outcome', c.standing],
    ['marked', `${atLines} of ${c.lines} lines; ${held} of ${c.inputs.length} inputs`],
  ];
  return [
    table(
      `Check of ${c.sheet} revision ${c.revision}`,
      ['of the record', ''],
      facts.map(([name, value]) => ({ cells: [name, plain(value)] })),
    ),
    ...(c.note === '' ? [] : [paragraph(`Note of the checker: ${plain(c.note)}`)]),
    ...(c.declaration === '' ? [] : [paragraph(`Declaration of the checker: ${plain(c.declaration)}`)]),
  ];
}

/** Each mark with its shape in the margin; what merely agrees at a line is said in one sentence. */
function schedule(c: CertifiedCheck): Line[] {
  const agreed = c.marks.filter((m) => m.place === 'line' && m.kind === 'agrees' && m.text === '');
  const said = c.marks
    .filter((m) => m.place !== 'input' || m.kind !== 'agrees')
    .filter((m) => !agreed.includes(m));
  const silent =
    agreed.length === 0
      ? []
      : [
          paragraph(
            `Agrees without remark: ${agreed.map((m) => m.where.replace(/^line /, '')).join(', ')}.`,
            {
              mark: 'agrees',
            },
          ),
        ];
  return [...said.map(markLine), ...silent];
}

function markLine(m: CertifiedMark): Line {
  const state = m.kind === 'agrees' ? '' : ` (${m.state})`;
  const head = `**${plain(m.where)}**, ${kinds[m.kind]}${state}`;
  const steps = m.steps.map((s) =>
    `${capital(s.word)} by ${s.by}, ${s.at}${s.text === '' ? '' : `: ${plain(s.text)}`}`.trim(),
  );
  const sentences = [m.text === '' ? head : `${head}: ${plain(m.text)}`, ...steps];
  return paragraph(sentences.map((s) => (/[.?!]$/.test(s) ? s : `${s}.`)).join(' '), { mark: m.kind });
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

function inputs(c: CertifiedCheck): Line[] {
  if (!c.inputs.some((i) => i.mark)) return [];
  const rows = c.inputs.map((i) => ({
    cells: [i.place, i.value, i.mark ?? 'not held', i.drawing ?? ''].map(plain),
  }));
  return [table('Inputs held against drawings', ['input', 'value', 'mark', 'drawing'], rows)];
}

function comparison(c: CertifiedCheck): Line[] {
  if (!c.comparison) return [];
  const { own, at, pairs } = c.comparison;
  const rows = pairs.map((p) => ({
    cells: [
      p.name,
      p.unit,
      number(writeValue(p.before)),
      number(writeValue(p.after)),
      number(writeDifference(p.change)),
    ],
  }));
  const caption = `${c.sheet} revision ${c.revision} beside ${own}, compared ${at}`;
  return [table(caption, ['value', 'unit', 'designer', 'checker', 'difference'], rows, 3)];
}

/** Figures are set in the mathematics face, whose widths line up; a dash is a word. */
const number = (text: string) =>
  text === '–' ? text : `$${text.replace('−', '-').replaceAll(',', '{,}').replace('%', '\\%')}$`;
