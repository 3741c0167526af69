import type { MemberDiagrams } from '@/lib/engine/diagrams/member-diagrams';
import { extremes, valueAt } from '@/lib/engine/diagrams/piecewise';
import type { WorkRow } from '@/lib/engine/force-method/work';
import type { Solution } from '@/lib/engine/solution';
import type { Block, TableBlock } from '@/templates/block';
import { compare, type Report } from './report';
import { figureOf, numberOf, readCell } from './rework-table';

/** What the engine has for the cells of a table, row by row; undefined cells are not held. */
type Expected = (number | undefined)[][];
type Reader = (table: TableBlock, match: RegExpExecArray, solution: Solution) => Expected;
type Three = Pick<MemberDiagrams, 'N' | 'V' | 'M'>;

/** Holds the cells of tables against the engine's own values, found by what the table says it is. */
export function holdTables(blocks: readonly Block[], solution: Solution, report: Report): void {
  for (const table of blocks) {
    if (table.kind !== 'table') continue;
    for (const [pattern, read] of readers) {
      const match = pattern.exec(table.caption ?? '');
      if (/Combinations\.$/.test(table.caption ?? '') && pattern === readers[0]?.[0])
        holdFactors(table, solution, report);
      if (match) hold(table, read(table, match, solution), report);
    }
  }
}

function hold(table: TableBlock, expected: Expected, report: Report): void {
  table.rows.forEach((row, r) => {
    row.cells.forEach((cell, k) => {
      const [want, shown] = [expected[r]?.[k], readCell(cell.replace(/\\unit\{[^}]*\}/, ''))];
      const value = numberOf(shown);
      if (want === undefined || value === undefined) return;
      report.counts.held += 1;
      const failed = (why: string) =>
        report.failures.push(`${table.id} row ${r + 1} column ${k + 1} held: ${why}`);
      compare(want, value, figureOf(shown), 'formula', report, failed);
    });
  });
}

/** The sums of the table of combinations against their factors. */
function holdFactors(table: TableBlock, { analysis }: Solution, report: Report): void {
  table.rows.forEach((row, r) => {
    const factors = Object.values(analysis.combinations[r]?.factors ?? {});
    const shown = [...(row.cells[2] ?? '').matchAll(/-?\d+\.\d+/g)].map((m) => Number(m[0]));
    report.counts.held += 1;
    if (shown.join() !== factors.join())
      report.failures.push(`${table.id} row ${r + 1} has other factors: ${shown.join()}`);
  });
}

const readers: [RegExp, Reader][] = [
  [/Joints\.$/, (_, __, { analysis }) => analysis.joints.map((j) => [undefined, j.x, j.y])],
  [
    /Members, walked/,
    (_, __, s) => s.analysis.members.map((m) => [undefined, undefined, lengthOf(s, m.id), m.EI]),
  ],
  [/Loads\.$/, (table, _, s) => table.rows.map((row) => loadRow(row.cells, s))],
  [/End forces, case (.*)\.$/, (t, m, s) => endRows(t, s, s.cases[m[1] ?? '']?.members)],
  [
    /End forces of the primary structure, case (.*)\.$/,
    (t, m, s) => endRows(t, s, s.primary.loaded[m[1] ?? '']?.members),
  ],
  [/End forces of unit state (\d+)/, (t, m, s) => endRows(t, s, s.primary.units[Number(m[1]) - 1]?.members)],
  [
    /Parts of case (.*)\.$/,
    (_, m, s) =>
      realParts(s.work.parts[m[1] ?? ''] ?? []).map((p) => [
        undefined,
        undefined,
        undefined,
        undefined,
        p.to - p.from,
        p.height,
        p.area,
        p.centroid,
      ]),
  ],
  [
    /Flexibility coefficients times/,
    (t, _, s) =>
      workRows(
        t,
        s.work.flexibility.flatMap((f) => f.rows),
        true,
      ),
  ],
  [
    /Gaps under case (.*), times/,
    (t, m, s) =>
      workRows(
        t,
        s.work.gaps.filter((g) => g.case === m[1]).flatMap((g) => g.rows),
        false,
      ),
  ],
  [/Coefficients \$EI_0f_\{ij\}/, (t, _, s) => coefficientRows(t, s)],
  [/Case (.*): stretches/, (t, m, s) => stretchRows(t, s, s.cases[m[1] ?? '']?.members)],
  [/Forces of the structure on its supports/, (t, _, s) => supportRows(t, s)],
  [/Greatest and least moments along/, (t, _, s) => spanRows(t, s)],
  [/Demands on members/, (_, __, s) => demandRows(s)],
];

/** Parts that are not rounding of the arithmetic. */
function realParts<T extends { area: number }>(parts: readonly T[]): T[] {
  const largest = Math.max(...parts.map((p) => Math.abs(p.area)));
  return parts.filter((p) => Math.abs(p.area) > 1e-12 * largest);
}

function memberNamed(s: Solution, cell: string | undefined) {
  return s.analysis.members.find((m) => `${m.start}–${m.end}` === cell);
}

function lengthOf({ analysis }: Solution, id: string): number {
  const m = analysis.members.find((x) => x.id === id);
  const [a, b] = [m?.start, m?.end].map((j) => analysis.joints.find((x) => x.id === j));
  return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : Number.NaN;
}

function loadRow(cells: readonly string[], { analysis }: Solution): (number | undefined)[] {
  const shown = numberOf(readCell((cells[2] ?? '').replace(/\\unit\{[^}]*\}/, ''))) ?? Number.NaN;
  if (cells[1]?.startsWith('$g')) {
    return [undefined, undefined, analysis.members.find((m) => m.weight !== undefined)?.weight];
  }
  const all = (analysis.cases.find((c) => c.id === cells[0])?.loads ?? []).flatMap((load): number[] => {
    if (load.kind === 'distributed') return [load.w1, load.w2];
    if (load.kind === 'joint') return [load.x, load.y, load.couple];
    return 'value' in load && load.kind !== 'settlement' && load.kind !== 'misfit' ? [load.value] : [];
  });
  if (all.length === 0) return [];
  const nearest = all.map(Math.abs).reduce((a, b) => (Math.abs(b - shown) < Math.abs(a - shown) ? b : a));
  return [undefined, undefined, nearest];
}

function endRows(
  table: TableBlock,
  s: Solution,
  members: Readonly<Record<string, Three>> | undefined,
): Expected {
  return table.rows.map(({ cells }) => {
    const m = memberNamed(s, cells[0]);
    const d = m && members?.[m.id];
    if (!m || !d) return [];
    const at = (f: Three['M']) =>
      cells[1] === m.start ? valueAt(f, 0) : valueAt(f, lengthOf(s, m.id), 'left');
    return [undefined, undefined, at(d.N), at(d.V), at(d.M)];
  });
}

/** Rows stand in the order of the engine; those of bending are held, totals and other terms are passed over. */
function workRows(table: TableBlock, rows: readonly WorkRow[], worked: boolean): Expected {
  const areas = rows.flatMap((r) => (r.kind === 'bending' ? [Math.abs(r.area)] : []));
  const bending = rows.filter((r) => r.kind === 'bending' && Math.abs(r.area) > 1e-12 * Math.max(...areas));
  const lead = table.columns[0]?.head === 'of' ? 1 : 0;
  let next = 0;
  return table.rows.map(({ cells, emphasis }) => {
    if (emphasis === 'total' || cells[lead]?.startsWith('$t_')) return [];
    const r = bending[next++];
    if (r?.kind !== 'bending' || table.columns.length - lead !== (worked ? 9 : 6)) return [];
    const blank = Array.from({ length: lead + 2 }, () => undefined);
    if (!worked) return [...blank, r.area, r.ordinate, r.k, r.value];
    return [...blank, undefined, r.to - r.from, r.height, r.area, r.ordinate, r.k, r.value];
  });
}

function coefficientRows(table: TableBlock, { work }: Solution): Expected {
  const columns = table.columns.map((c) => Number(/X_\{(\d+)\}/.exec(c.head)?.[1] ?? Number.NaN) - 1);
  return table.rows.map((_, i) =>
    columns.map((j) =>
      Number.isNaN(j)
        ? undefined
        : work.flexibility.find((f) => f.i === Math.max(i, j) && f.j === Math.min(i, j))?.total,
    ),
  );
}

function stretchRows(
  table: TableBlock,
  s: Solution,
  members: Readonly<Record<string, Three>> | undefined,
): Expected {
  const straight = table.columns[2]?.head === '$l$';
  const passed = new Map<string, number>();
  return table.rows.map(({ cells }) => {
    const m = memberNamed(s, cells[0]);
    const d = m && members?.[m.id];
    if (!m || !d) return [];
    const wanted = d.M.filter(
      (p) => Math.abs(p.c[3] ?? 0) < 1e-9 && Math.abs(p.c[2] ?? 0) < 1e-9 === straight,
    );
    const k = passed.get(m.id) ?? 0;
    passed.set(m.id, k + 1);
    const piece = wanted[k];
    if (!piece) return [];
    const [start, V] = [valueAt([piece], piece.from), piece.c[1]];
    if (straight) return [undefined, piece.from, piece.to - piece.from, start, V];
    return [undefined, piece.from, start, V, -2 * (piece.c[2] ?? 0)];
  });
}

function supportRows(table: TableBlock, s: Solution): Expected {
  return table.rows.map(({ cells }) => {
    const component = cells[1]?.startsWith('horizontal')
      ? 'x'
      : cells[1]?.startsWith('vertical')
        ? 'y'
        : 'turn';
    const of = (list: Solution['combinations'][number]['reactions'] | undefined) => {
      const found = list?.find(
        ({ quantity: q }) => q.kind === 'reaction' && q.joint === cells[0] && q.component === component,
      );
      return found && (component === 'y' ? found.value : -found.value);
    };
    return table.columns.map(({ head }) => {
      const id = head.replace(/^\$\\mathrm\{\(?(.*?)\)?\}\$$/, '$1');
      return of(s.cases[id]?.reactions) ?? of(s.combinations.find((c) => c.id === id)?.reactions);
    });
  });
}

const strengthOf = (s: Solution) =>
  s.combinations.filter((c) => s.analysis.combinations.find((a) => a.id === c.id)?.purpose === 'strength');

function spanRows(table: TableBlock, s: Solution): Expected {
  return table.rows.map(({ cells }) => {
    const m = memberNamed(s, cells[0]);
    if (!m) return [];
    const all = strengthOf(s).flatMap((c) =>
      c.members[m.id] ? [extremes((c.members[m.id] as Three).M)] : [],
    );
    const max = all.map((e) => e.max).reduce((a, b) => (b.value > a.value ? b : a));
    const min = all.map((e) => e.min).reduce((a, b) => (b.value < a.value ? b : a));
    return [undefined, max.value, max.s, undefined, min.value, min.s];
  });
}

function demandRows(s: Solution): Expected {
  const states = strengthOf(s).length > 0 ? strengthOf(s) : Object.values(s.cases);
  return s.analysis.members.map((m) => {
    const all = (which: 'N' | 'V' | 'M') =>
      states.flatMap((c) => (c.members[m.id] ? [extremes((c.members[m.id] as Three)[which])] : []));
    const top = (which: 'N' | 'V' | 'M') => Math.max(...all(which).map((e) => e.max.value));
    const low = (which: 'N' | 'V' | 'M') => Math.min(...all(which).map((e) => e.min.value));
    const V = Math.max(top('V'), -low('V'));
    return [
      undefined,
      -low('N'),
      undefined,
      top('N'),
      undefined,
      V,
      undefined,
      top('M'),
      undefined,
      -low('M'),
    ];
  });
}
