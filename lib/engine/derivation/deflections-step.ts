import type { DisplacementAsk } from '@/lib/model/analysis';
import type { MemberDiagrams } from '../diagrams/member-diagrams';
import type { WorkRow } from '../force-method/work';
import type { Context } from './context';
import { dimensions } from './dimensions';
import { quotient, type Value } from './expression';
import { decimalsFor } from './figure-plan';
import { finalRows } from './final-rows';
import { type Relation, relate } from './relation';
import { referenceStiffness, referenceValue } from './structure-step';
import { inCase, type SymbolName } from './symbol-name';
import { type WorkTable, workTable } from './work-table';

/** One displacement that was asked for, by the work of its unit load with the final moments. */
export interface Deflection {
  ask: DisplacementAsk;
  index: number;
  symbol: SymbolName;
  cases: { id: string; table: WorkTable; result?: Relation }[];
  limit?: Value;
  combinations: { id: string; value: Value; ratio?: Value }[];
}

/** Step 13: displacements. Without a value of EI0 only EI0 times the displacement is known. */
export interface DeflectionsStep {
  kind: 'deflections';
  deflections: Deflection[];
  EI0?: Value;
}

export function deriveDeflections(ctx: Context): DeflectionsStep {
  const { solution, analysis } = ctx;
  const value = solution.reference.value;
  const deflections = solution.displacements.flatMap((found): Deflection[] => {
    const ask = analysis.displacements[found.ask];
    if (!ask) return [];
    const symbol: SymbolName = {
      letter: ask.direction === 'rotation' ? 'θ' : 'v',
      sub: [`${found.ask + 1}`],
    };
    const turn = ask.direction === 'rotation';
    const cases = Object.entries(found.cases).map(([id, c]) => {
      const table = tableOf(ctx, found.unit.members, id, c, symbol, turn);
      const total = table.groups[0]?.total;
      return {
        id,
        table,
        result: value === undefined || !total ? undefined : resultOf(ctx, total, value, turn, symbol, id),
      };
    });
    const scale = turn ? undefined : smallScale(ctx);
    const shown = (v: number, id?: string): Value => ({
      kind: 'value',
      symbol: id === undefined ? undefined : { ...symbol, super: id },
      value: v,
      dimension: turn ? dimensions.pure : dimensions.length,
      decimals: turn ? 6 : ctx.figures.deflection,
      scale,
    });
    const combinations = found.combinations.flatMap(({ id, value: v, ratio }) =>
      v === undefined
        ? []
        : [
            {
              id,
              value: shown(v, id),
              ratio:
                ratio === undefined
                  ? undefined
                  : ({ kind: 'value', value: ratio, dimension: dimensions.pure, decimals: 2 } as const),
            },
          ],
    );
    const limit = ask.limit ? shown(ask.limit.value) : undefined;
    return [{ ask, index: found.ask, symbol, cases, limit, combinations }];
  });
  return { kind: 'deflections', deflections, EI0: value === undefined ? undefined : referenceValue(value) };
}

export const smallScale = ({ analysis }: Context): number => (analysis.units === 'US' ? 12 : 1000);

function resultOf(
  ctx: Context,
  total: Value,
  EI0: number,
  turn: boolean,
  symbol: SymbolName,
  id: string,
): Relation {
  const name = { ...symbol, super: id };
  const value = total.value / EI0;
  const formula = quotient(total, referenceValue(EI0));
  if (turn)
    return relate(
      name,
      formula,
      { dimension: dimensions.pure, decimals: decimalsFor([value], 4, 5, 9) },
      value,
    );
  const scale = smallScale(ctx);
  // The coherent result carries one figure more than the small unit shows.
  const decimals = ctx.figures.deflection + (scale === 12 ? 2 : 4);
  const line = relate(name, formula, { dimension: dimensions.length, decimals }, value);
  const again: Value = { ...line.result, decimals: ctx.figures.deflection, scale };
  return { ...line, again, boxed: true };
}

/** EI0 v keeps one figure more than the printed v needs; without a value of EI0, six significant figures. */
function totalDecimals(ctx: Context, total: number, turn: boolean): number {
  const EI0 = ctx.solution.reference.value;
  if (EI0 === undefined || turn) return decimalsFor([total], 6, 0, 4);
  const unit = (EI0 * 10 ** -ctx.figures.deflection) / smallScale(ctx);
  return Math.max(0, Math.min(6, 1 - Math.floor(Math.log10(unit))));
}

function tableOf(
  ctx: Context,
  unit: Readonly<Record<string, Pick<MemberDiagrams, 'M'>>>,
  id: string,
  found: { rows: WorkRow[]; total: number },
  symbol: SymbolName,
  turn: boolean,
): WorkTable {
  const final = ctx.solution.cases[id]?.members ?? {};
  const bending = ctx.analysis.members.flatMap((m) => {
    const [u, f] = [unit[m.id], final[m.id]];
    return u && f && !m.steps ? finalRows(m.id, u.M, f.M, m.EI / referenceStiffness(ctx)) : [];
  });
  const stepped = found.rows.filter(
    (r) => r.kind === 'bending' && ctx.analysis.members.find((m) => m.id === r.member)?.steps !== undefined,
  );
  const others = found.rows.filter((r) => r.kind !== 'bending');
  const height = { force: 1, length: 2, temperature: 0 };
  const ordinate = turn ? dimensions.pure : dimensions.length;
  return workTable(
    ctx,
    [
      {
        symbol: { ...symbol, super: id, timesEI0: true },
        rows: [...bending, ...stepped, ...others],
        total: found.total,
        states: {
          unit: (s) => ({
            ...s,
            mark: 'bar',
            sub: [...(s.sub ?? []), ',', `${symbol.letter}${symbol.sub?.[0]}`],
          }),
          perUnit: turn ? dimensions.moment : dimensions.force,
          other: (s) => inCase(s, id),
          perOther: dimensions.pure,
        },
      },
    ],
    { dimension: { force: 1, length: turn ? 2 : 3, temperature: 0 }, area: height, ordinate },
    totalDecimals(ctx, found.total, turn),
  );
}
