import type { TableBlock } from '@/templates/block';
import { type Node, parseTex } from './parse-tex';
import { compare, type Report } from './report';
import { type Lookup, readUnit, Unknown, type Worked, workOut } from './work-out';

interface Column {
  name?: string;
  /** The rule its head states. */
  rule?: Node;
  factor: number;
}

/** Works a table again: columns whose head is a formula of other columns, rows whose label is one of other rows, totals. */
export function reworkTable(
  table: TableBlock,
  printed: ReadonlyMap<string, Worked>,
  full: ReadonlyMap<string, Worked>,
  report: Report,
): void {
  const columns = table.columns.map((c) => readHead(c.head, c.unit));
  const numbers = table.rows.map((row) => row.cells.map(readCell));
  const failed = (row: number) => (why: string) =>
    report.failures.push(`${table.id} row ${row + 1} (${table.rows[row]?.cells[0]}): ${why}`);
  table.rows.forEach((row, r) => {
    if (row.emphasis !== 'total') reworkCells(columns, numbers[r] ?? [], printed, report, failed(r));
  });
  reworkRows(table, columns, numbers, printed, report, failed);
  reworkTotals(table, numbers, report, failed);
  holdCells(table, columns, numbers, full, report, failed);
}

export function readCell(
  cell: string,
): Extract<Node, { kind: 'number' }> | { negative: Extract<Node, { kind: 'number' }> } | undefined {
  const match = /^(?:\*\*)?\$(.*)\$(?:\*\*)?$/.exec(cell);
  if (!match?.[1]) return undefined;
  try {
    const node = parseTex(match[1]);
    if (node.kind === 'number') return node;
    if (node.kind === 'negative' && node.of.kind === 'number') return { negative: node.of };
    if (node.kind === 'quotient' && node.over.kind === 'number' && node.under.kind === 'number') {
      return { kind: 'number', value: node.over.value / node.under.value, decimals: 15, unit: '' };
    }
    return undefined;
  } catch {
    return undefined;
  }
}

type Cell = ReturnType<typeof readCell>;

export const numberOf = (c: Cell): number | undefined =>
  c === undefined ? undefined : 'negative' in c ? -c.negative.value : c.value;
export const figureOf = (c: Cell): number =>
  c === undefined ? 1 : 10 ** -('negative' in c ? c.negative.decimals : c.decimals);

function readHead(head: string, unit: string | undefined): Column {
  const factor = unit === undefined ? 1 : readUnit(unit).factor;
  const math = [...head.matchAll(/(?<!\\)\$([^$]*)\$/g)].map((m) => m[1] ?? '').at(-1);
  if (math === undefined) return { factor };
  try {
    const sides = math.split('=');
    const first = parseTex(sides[0] ?? '');
    if (sides.length === 2) {
      const rule = parseTex(sides[1] ?? '');
      return { name: first.kind === 'symbol' ? first.name : undefined, rule, factor };
    }
    if (first.kind === 'symbol') return { name: first.name, factor };
    return { rule: first, factor };
  } catch {
    return { factor };
  }
}

function reworkCells(
  columns: readonly Column[],
  cells: readonly Cell[],
  printed: ReadonlyMap<string, Worked>,
  report: Report,
  failed: (why: string) => void,
): void {
  columns.forEach((column, k) => {
    const shown = numberOf(cells[k]);
    if (!column.rule || shown === undefined) return;
    const lookup: Lookup = (name) => {
      const at = columns.findIndex((c, i) => c.name === name && i !== k);
      const value = at === -1 ? undefined : numberOf(cells[at]);
      if (value !== undefined) return { value, unit: undefined };
      return at === -1 ? printed.get(name) : undefined;
    };
    try {
      const worked = workOut(column.rule, lookup).value;
      report.counts.cells += 1;
      compare(worked, shown, figureOf(cells[k]), 'cell', report, failed);
    } catch (error) {
      if (!(error instanceof Unknown)) throw error;
    }
  });
}

/** Labels like b_2 = b_1 − μ b_3: each numeric column by itself. */
function reworkRows(
  table: TableBlock,
  columns: readonly Column[],
  numbers: readonly (readonly Cell[])[],
  printed: ReadonlyMap<string, Worked>,
  report: Report,
  failed: (row: number) => (why: string) => void,
): void {
  const labels = table.rows.map((row) => /^\$([^$]*)\$$/.exec(row.cells[0] ?? '')?.[1]);
  const names = labels.map((label) => {
    if (label === undefined) return undefined;
    try {
      const node = parseTex(label.split('=')[0] ?? '');
      return node.kind === 'symbol' ? node.name : undefined;
    } catch {
      return undefined;
    }
  });
  labels.forEach((label, r) => {
    const side = label?.split('=')[1];
    if (side === undefined) return;
    const rule = parseTex(side);
    table.columns.forEach((_, k) => {
      const shown = numberOf(numbers[r]?.[k]);
      if (shown === undefined || table.columns[k]?.align !== 'right') return;
      const lookup: Lookup = (name) => {
        const at = names.indexOf(name);
        const value = at === -1 ? undefined : numberOf(numbers[at]?.[k]);
        return value === undefined
          ? (printed.get(name) ?? printed.get(`${name}^{${columns[k]?.name}}`))
          : { value, unit: undefined };
      };
      try {
        const worked = workOut(rule, lookup).value;
        report.counts.cells += 1;
        compare(worked, shown, figureOf(numbers[r]?.[k]), 'cell', report, failed(r));
      } catch (error) {
        if (error instanceof Unknown) report.unparsed.push(`${table.id}: ${label} needs ${error.message}`);
        else throw error;
      }
    });
  });
}

function reworkTotals(
  table: TableBlock,
  numbers: readonly (readonly Cell[])[],
  report: Report,
  failed: (row: number) => (why: string) => void,
): void {
  let first = 0;
  table.rows.forEach((row, r) => {
    if (row.emphasis !== 'total') return;
    table.columns.forEach((_, k) => {
      const shown = numberOf(numbers[r]?.[k]);
      if (shown === undefined) return;
      let total = 0;
      for (let i = first; i < r; i++) total += numberOf(numbers[i]?.[k]) ?? 0;
      report.counts.cells += 1;
      compare(total, shown, figureOf(numbers[r]?.[k]), 'cell', report, failed(r));
    });
    first = r + 1;
  });
}

/** A cell whose row names a quantity and whose column names a case is that quantity in that case. */
function holdCells(
  table: TableBlock,
  columns: readonly Column[],
  numbers: readonly (readonly Cell[])[],
  full: ReadonlyMap<string, Worked>,
  report: Report,
  failed: (row: number) => (why: string) => void,
): void {
  table.rows.forEach((row, r) => {
    const label = /^\$([^$]*)\$$/.exec(row.cells[0] ?? '')?.[1];
    if (label === undefined) return;
    let name: string | undefined;
    try {
      const node = parseTex(label.split('=')[0] ?? '');
      name = node.kind === 'symbol' ? node.name : undefined;
    } catch {
      return;
    }
    if (name === undefined) return;
    columns.forEach((column, k) => {
      const shown = numberOf(numbers[r]?.[k]);
      const alone = columns.length === 2 && k === 1;
      if (!alone && !column.name?.startsWith('\\mathrm')) return;
      const known = full.get(alone ? `${name}` : `${name}^{${column.name}}`);
      if (shown === undefined || !known) return;
      report.counts.held += 1;
      compare(known.value, shown, figureOf(numbers[r]?.[k]), 'formula', report, failed(r));
    });
  });
}
