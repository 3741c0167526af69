// server only
import type { Knex } from 'knex';

/** The sheet that a checker made for a check, with the check's standing. */
export interface OwnSheetRow {
  check_id: string;
  sheet_id: string;
  number: number;
  checker_id: string;
  check_state: 'open' | 'agreed' | 'returned' | 'void';
}

const ownSheets = (db: Knex, officeId: string) =>
  db('check_sheets as o')
    .join('checks as c', 'c.id', 'o.check_id')
    .join('sheets as s', 's.id', 'o.sheet_id')
    .where({ 'o.office_id': officeId })
    .select('o.check_id', 'o.sheet_id', 's.number', 'c.checker_id', 'c.state as check_state');

export async function ownSheetOfCheck(
  db: Knex,
  officeId: string,
  checkId: string,
): Promise<OwnSheetRow | undefined> {
  return ownSheets(db, officeId).where({ 'o.check_id': checkId }).first();
}

/** The check that a sheet was made for, if it is a checker's own. */
export async function checkOfOwnSheet(
  db: Knex,
  officeId: string,
  sheetId: string,
): Promise<OwnSheetRow | undefined> {
  return ownSheets(db, officeId).where({ 'o.sheet_id': sheetId }).first();
}

export async function insertOwnSheet(
  trx: Knex,
  row: { check_id: string; office_id: string; sheet_id: string; begun_at: Date },
): Promise<void> {
  await trx('check_sheets').insert(row);
}

export interface ComparisonRow {
  check_id: string;
  office_id: string;
  own_revision_id: string;
  pairs: unknown;
  at: Date;
}

export async function insertComparison(trx: Knex, row: ComparisonRow): Promise<void> {
  await trx('check_comparisons').insert({ ...row, pairs: JSON.stringify(row.pairs) });
}

export async function comparisonOf(
  db: Knex,
  officeId: string,
  checkId: string,
): Promise<ComparisonRow | undefined> {
  return db('check_comparisons').where({ office_id: officeId, check_id: checkId }).first();
}

/** Of these sheets those that a person checks blind and has not compared yet. */
export async function hiddenSheets(
  db: Knex,
  officeId: string,
  personId: string,
  sheetIds: readonly string[],
): Promise<string[]> {
  return db('checks as c')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .leftJoin('check_comparisons as k', 'k.check_id', 'c.id')
    .where({ 'c.office_id': officeId, 'c.checker_id': personId, 'c.blind': 1 })
    .whereIn('c.state', ['open', 'returned'])
    .whereIn('r.sheet_id', sheetIds)
    .whereNull('k.check_id')
    .distinct()
    .pluck('r.sheet_id');
}
