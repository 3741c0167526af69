import type { Solution } from '@/lib/engine/solution';
import type { Block, EquationRow, TableBlock } from '@/templates/block';
import { holdTables } from './hold-tables';
import { type Node, parseTex } from './parse-tex';
import { compare, type Report } from './report';
import { reworkTable } from './rework-table';
import {
  type Lookup,
  lastFigure,
  roundingOf,
  same,
  symbolsIn,
  UnitsDiffer,
  Unknown,
  type Worked,
  workOut,
} from './work-out';

const emptyReport = (): Report => ({
  counts: { substitutions: 0, formulas: 0, relations: 0, cells: 0, held: 0, chains: 0 },
  worst: { substitution: 0, formula: 0, cell: 0 },
  failures: [],
  statements: [],
  unparsed: [],
});

/** Works the document's own text again. `full` gives the full-precision value behind a symbol. */
export function rework(
  blocks: readonly Block[],
  full: ReadonlyMap<string, Worked>,
  solution?: Solution,
): Report {
  const report = emptyReport();
  const printed = printedValues(blocks);
  const lookup: Lookup = (name) => full.get(name);
  for (const block of blocks) {
    switch (block.kind) {
      case 'equations':
        for (const row of block.rows) reworkRow(block.id, row, lookup, report);
        if (block.text) reworkSentence(block.id, block.text, lookup, report);
        break;
      case 'paragraph':
      case 'caution':
        reworkSentence(block.id, block.text, lookup, report);
        break;
      case 'table':
        reworkTable(block, printed, full, report);
        break;
      default:
        break;
    }
  }
  if (solution) holdTables(blocks, solution, report);
  return report;
}

/** Symbols with the number the document prints for them: results of lines and totals of tables. */
function printedValues(blocks: readonly Block[]): Map<string, Worked> {
  const printed = new Map<string, Worked>();
  const put = (label: string, value: string) => {
    try {
      const [name, worked] = [parseTex(label), workOut(parseTex(value))];
      if (name.kind === 'symbol') printed.set(name.name, worked);
    } catch {
      // What cannot be read is listed where it stands.
    }
  };
  for (const block of blocks) {
    if (block.kind === 'equations') {
      for (const row of block.rows) {
        const result = row.chain.findLast((c) => /\d/.test(c));
        if (result) put(row.lhs, row.chain.length > 2 && row.boxed ? (row.chain.at(-1) ?? result) : result);
      }
    }
    if (block.kind === 'table') totalsOf(block, put);
  }
  return printed;
}

function totalsOf(block: TableBlock, put: (label: string, value: string) => void): void {
  for (const row of block.rows) {
    if (row.emphasis !== 'total') continue;
    const label = row.cells.find((c) => c !== '');
    const value = row.cells.at(-1);
    if (label && value) put(label.slice(1, -1), value.slice(1, -1));
  }
}

const wordy = /\\int|\\sum|\\text|\\dd/;

function reworkRow(id: string, row: EquationRow, lookup: Lookup, report: Report): void {
  if (row.chain.length === 0) {
    if (/\\sum_\{|\\int/.test(row.lhs)) {
      report.statements.push(`${id}: ${row.lhs}`);
      return;
    }
    const bare = row.lhs
      .replace(/^\\textstyle\\sum [A-Z]_\{[^}]*\}+:\\;/, '')
      .replace(/^\\text\{[^}]*:\}\\quad /, '');
    reworkEquation(id, bare, lookup, report);
    return;
  }
  const members = row.chain.map((tex) => ({ tex, node: read(tex, id, report) }));
  if (members.some((m) => m.node === undefined)) return;
  const nodes = members.flatMap((m) => (m.node ? [m.node] : []));
  reworkChain(id, row.lhs, nodes, lookup, report);
}

function read(tex: string, id: string, report: Report): Node | undefined {
  if (wordy.test(tex.replaceAll('\\text{–}', '–'))) {
    report.statements.push(`${id}: ${tex}`);
    return undefined;
  }
  try {
    return parseTex(tex);
  } catch (error) {
    report.unparsed.push(`${id}: ${tex} (${String(error)})`);
    return undefined;
  }
}

/** A chain of equalities: each substitution against the number after it, each formula at full precision, units throughout. */
export function reworkChain(
  id: string,
  lhs: string,
  nodes: readonly Node[],
  lookup: Lookup,
  report: Report,
): void {
  const results = nodes.filter((n) => lastFigure(n) !== undefined);
  const [result] = results;
  if (!result) {
    report.statements.push(`${id}: ${lhs}`);
    return;
  }
  const failed = (why: string) => report.failures.push(`${id}: ${lhs}: ${why}`);
  try {
    let unit = workOut(result).unit;
    for (const node of nodes) {
      const symbols = symbolsIn(node);
      const last = lastFigure(node);
      if (last !== undefined && node !== result) {
        // The same result once more in another unit.
        unit = same(unit, workOut(node).unit);
        compare(workOut(result).value, workOut(node).value, last, 'substitution', report, failed);
      } else if (last === undefined && symbols.length === 0) {
        const worked = workOut(node);
        unit = same(unit, worked.unit);
        report.counts.substitutions += 1;
        compare(worked.value, workOut(result).value, lastFigure(result) ?? 1, 'substitution', report, failed);
      } else if (last === undefined) {
        const worked = workOut(node, lookup);
        unit = same(unit, worked.unit);
        report.counts.formulas += 1;
        compare(worked.value, workOut(result).value, lastFigure(result) ?? 1, 'formula', report, failed);
      }
    }
    holdSymbol(id, lhs, result, lookup, report);
    report.counts.chains += 1;
  } catch (error) {
    if (error instanceof UnitsDiffer) failed(`units differ: ${error.message}`);
    else if (error instanceof Unknown)
      report.statements.push(`${id}: ${lhs} (${error.message} has no value)`);
    else throw error;
  }
}

/** The symbol on the left against the number on the right. */
function holdSymbol(id: string, lhs: string, result: Node, lookup: Lookup, report: Report): void {
  let node: Node;
  try {
    node = parseTex(lhs);
  } catch {
    return;
  }
  if (node.kind !== 'symbol') return;
  const known = lookup(node.name);
  if (!known) return;
  report.counts.held += 1;
  const failed = (why: string) => report.failures.push(`${id}: ${lhs} held against its value: ${why}`);
  compare(known.value, workOut(result).value, lastFigure(result) ?? 1, 'formula', report, failed);
}

/** a + b + … = c, true with its printed figures, or in symbols at full precision. */
function reworkEquation(id: string, tex: string, lookup: Lookup, report: Report): void {
  const sides = tex.split('=');
  const nodes = sides.map((s) => read(s, id, report));
  const [left, right] = nodes;
  if (!left || !right || nodes.length !== 2) {
    if (nodes.length !== 2) report.unparsed.push(`${id}: ${tex}`);
    return;
  }
  const failed = (why: string) => report.failures.push(`${id}: ${tex}: ${why}`);
  try {
    const [a, b] = [workOut(left, lookup), workOut(right, lookup)];
    same(a.unit, b.unit);
    const last = lastFigure(right);
    report.counts.relations += 1;
    if (symbolsIn(left).length === 0 && last !== undefined) {
      compare(a.value, b.value, last, 'substitution', report, failed);
      return;
    }
    const size = termSize(left, lookup);
    const allowed = roundingOf(left, lookup) + roundingOf(right, lookup) + 1e-9 * size;
    if (Math.abs(a.value - b.value) > allowed) failed(`${a.value} is not ${b.value}`);
  } catch (error) {
    if (error instanceof UnitsDiffer) failed(`units differ: ${error.message}`);
    else if (error instanceof Unknown) report.statements.push(`${id}: ${tex}`);
    else throw error;
  }
}

function termSize(node: Node, lookup: Lookup): number {
  if (node.kind === 'sum') return Math.max(...node.of.map((t) => termSize(t, lookup)));
  return Math.abs(workOut(node, lookup).value);
}

/** Equalities inside sentences. */
function reworkSentence(id: string, text: string, lookup: Lookup, report: Report): void {
  const joinedText = text
    .replace(/\$\s*\$=/g, '=')
    .replace(/\$ \$= ?/g, '=')
    .replace(/=\$ ?\$/g, '=');
  for (const part of joinedText.split(/(?<!\\)\$/).filter((_, i) => i % 2 === 1)) {
    const sides = part.split('=').map((s) => s.trim());
    if (sides.length < 2 || sides.some((s) => s === '') || !/\d/.test(sides.at(-1) ?? '')) continue;
    const nodes = sides.slice(1).map((s) => read(s, id, report));
    const first = read(sides[0] ?? '', id, report);
    if (!first || nodes.some((n) => n === undefined)) continue;
    reworkChain(
      id,
      sides[0] ?? '',
      [...(first.kind === 'symbol' ? [] : [first]), ...nodes.flatMap((n) => (n ? [n] : []))],
      lookup,
      report,
    );
  }
}
