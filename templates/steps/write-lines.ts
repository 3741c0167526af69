import type { Value } from '@/lib/engine/derivation/expression';
import type { Placed } from '@/lib/engine/derivation/geometry';
import type { Relation } from '@/lib/engine/derivation/relation';
import type { StaticsStep } from '@/lib/engine/derivation/statics-equation';
import type { SymbolName } from '@/lib/engine/derivation/symbol-name';
import type { EquationOfSet } from '@/lib/engine/derivation/together';
import type { UnitSet } from '@/lib/model/analysis';
import { quantityNumber, quantityTex } from '@/lib/typeset/quantity-tex';
import { formulaTex, substitutionTex } from '@/lib/typeset/write-expression';
import { symbolTex } from '@/lib/typeset/write-symbol';
import type { EquationRow } from '../block';
import { countWords, listWords, memberWords, plain } from './words';

/** symbol = formula = figures = result; members that would only repeat their neighbour are left out. */
export function relationRow(r: Relation, units: UnitSet, note?: string): EquationRow {
  const chain = [
    formulaTex(r.formula, units),
    substitutionTex(r.formula, units),
    quantityTex(r.result, units),
    ...(r.again ? [quantityTex(r.again, units)] : []),
  ];
  if (r.formula.kind === 'number' && r.formula.n === 0)
    return { lhs: symbolTex(r.symbol), chain: ['0'], note };
  const distinct = chain.filter((tex, i) => tex !== chain[i - 1]);
  return { lhs: symbolTex(r.symbol), chain: distinct, boxed: r.boxed, note };
}

/** A number of a table: `$3.908$`. A missing value is a dash. */
export function cell(value: number | undefined, decimals: number, units: UnitSet): string {
  if (value === undefined) return '–';
  return `$${quantityNumber({ value, decimals, dimension: { force: 0, length: 0, temperature: 0 } }, units)}$`;
}

/** A value of a table without its unit, which the head has. */
export const valueCell = (v: Value, units: UnitSet): string => `$${quantityNumber(v, units)}$`;

/** A symbol inside a sentence or a cell. */
export const inline = (s: SymbolName): string => `$${symbolTex(s)}$`;

/** A value with its unit inside a sentence. */
export const inlineValue = (v: Value, units: UnitSet): string => `$${quantityTex(v, units)}$`;

/** An equilibrium equation, then the unknown that it gives. */
export function staticsRows(step: StaticsStep, units: UnitSet): EquationRow[] {
  const head = sumTex(step.sum);
  if (step.check) {
    const terms = substitutionTex(step.check.formula, units);
    return [{ lhs: `${head}\\;${terms}=${quantityTex(step.check.result, units)}`, chain: [] }];
  }
  if (step.set) return setRows(step, step.set, units);
  if (!step.relation) return [];
  const own = relationRow(step.relation, units);
  if (step.relation.formula.kind === 'number') return [own];
  return [{ lhs: `${head}\\;${formulaTex(step.equation, units)}=0`, chain: [] }, own];
}

/** A line whose formula is figures already: it stands once. */
function figuresRow(r: Relation, units: UnitSet): EquationRow {
  const row = relationRow(r, units);
  return { ...row, chain: row.chain.slice(-2) };
}

/** An equation of a set in symbols, then with its figures; with the last, the unknowns. */
function setRows(step: StaticsStep, set: EquationOfSet, units: UnitSet): EquationRow[] {
  const collected = relationRow(set.right, units);
  const chain = collected.chain.length === 0 ? ['0'] : collected.chain;
  return [
    { lhs: `${sumTex(step.sum)}\\;${formulaTex(step.equation, units)}=0`, chain: [] },
    { lhs: formulaTex(set.left, units), chain: chain.slice(-2) },
    ...set.solution.map((r) => figuresRow(r, units)),
    ...set.inserted.map(({ sum, relation }) => ({
      lhs: `${sumTex(sum)}\\;${substitutionTex(relation.formula, units)}=${quantityTex(relation.result, units)}`,
      chain: [],
    })),
  ];
}

/** Whether a line gives a force at a hinge, F with the name of a member. */
export const findsHingeForce = ({ relation, set }: StaticsStep): boolean =>
  [relation?.symbol, ...(set?.unknowns ?? []).map((u) => u.symbol)].some((s) => s?.letter === 'F');

/** ΣM_A:, ΣF_x:, ΣF_y: */
export function sumTex(sum: StaticsStep['sum']): string {
  if (sum.kind === 'moment')
    return `\\textstyle\\sum ${symbolTex({ letter: 'M', sub: [sum.joint ?? 'O'] })}:`;
  return `\\textstyle\\sum ${symbolTex({ letter: 'F', sub: [Math.abs(sum.x) > Math.abs(sum.y) ? 'x' : 'y'] })}:`;
}

/** Why the equation has one unknown: "Moments about A, where R_Ax and R_Ay meet". */
export function staticsWords(step: StaticsStep, placed: ReadonlyMap<string, Placed>, units: UnitSet): string {
  const piece = step.piece ? pieceWords(step.piece, placed) : '';
  const start = piece === '' ? '' : `On ${piece}: `;
  const said = (text: string) =>
    start === '' ? text.charAt(0).toUpperCase() + text.slice(1) : `${start}${text}`;
  const arms = step.arms.map((a) => `${a.symbol ? inline(a.symbol) : ''} $= ${quantityTex(a, units)}$`);
  const armed = arms.length === 0 ? '' : `, with the arm${arms.length > 1 ? 's' : ''} ${listWords(arms)}`;
  const unused = step.check ? ', not used yet, as a check' : setWords(step.set);
  if (step.sum.kind === 'force') {
    return `${said(Math.abs(step.sum.x) > Math.abs(step.sum.y) ? 'horizontal forces' : 'vertical forces')}${armed}${unused}:`;
  }
  const [a, b] = step.passing;
  const why =
    a && b ? `, where ${inline(a)} and ${inline(b)} meet` : a ? `, through which ${inline(a)} passes` : '';
  const joint = plain(step.sum.joint ?? 'O');
  const about = step.passing.length === 0 && atHinge(step, placed) ? `the hinge at ${joint}` : joint;
  return `${said(`moments about ${about}`)}${step.check ? '' : why}${armed}${unused}:`;
}

/** Which of the equations of a set this is, and what becomes of them. */
function setWords(set: EquationOfSet | undefined): string {
  if (!set) return '';
  const names = listWords(set.unknowns.map((u) => (u.symbol ? inline(u.symbol) : '')));
  if (set.place === 1)
    return `, the first of ${countWords(set.of)} equations that give ${names} only together`;
  if (set.place < set.of) return ', another of them';
  return set.of === 2
    ? ', the other of the two; together they give both by the rule of determinants'
    : ', the last of them; what they give together, and each of them with it put in';
}

/** The point of a moment sum is where the piece ends and others go on. */
function atHinge({ sum, piece }: StaticsStep, placed: ReadonlyMap<string, Placed>): boolean {
  if (sum.kind !== 'moment' || !piece) return false;
  const meets = (p: Placed) => p.start.id === sum.joint || p.end.id === sum.joint;
  return [...placed.values()].some((p) => meets(p) && !piece.includes(p.member.id));
}

function pieceWords(piece: readonly string[], placed: ReadonlyMap<string, Placed>): string {
  const names = piece.map((id) => {
    const p = placed.get(id);
    return p ? memberWords(p) : plain(id);
  });
  return `the piece of ${listWords(names)}`;
}
