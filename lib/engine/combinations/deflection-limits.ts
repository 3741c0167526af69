import { z } from 'zod';
import data from './deflection-limits.json';

const divisor = z.number().positive().optional();

const table = z.object({
  key: z.string(),
  title: z.string(),
  /** A cantilever counts as this many times its length. */
  cantilever: z.number().positive(),
  cantileverEvidence: z.string(),
  evidence: z.string(),
  rows: z.array(
    z.object({ key: z.string(), title: z.string(), L: divisor, 'S or W': divisor, 'D+L': divisor }),
  ),
});

/** Published limits: span over the divisor, for the action that deflects. */
export const deflectionTables = z
  .object({ form: z.literal('fairhand.deflection-limits/1'), tables: z.array(table) })
  .parse(data).tables;

export type DeflectionTable = z.infer<typeof table>;

/** Limit in the unit of `length`, with its source; undefined where the table sets none. */
export function deflectionLimit(
  table: DeflectionTable,
  row: string,
  action: 'L' | 'S or W' | 'D+L',
  length: number,
  cantilever: boolean,
): { value: number; source: string } | undefined {
  const over = table.rows.find((r) => r.key === row)?.[action];
  if (over === undefined) return undefined;
  const span = cantilever ? table.cantilever * length : length;
  return {
    value: span / over,
    source: `${table.title}: ${cantilever ? `${table.cantilever} × length` : 'span'}/${over}`,
  };
}
