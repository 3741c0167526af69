// server only
import type { Knex } from 'knex';

export interface RevisionRow {
  id: string;
  office_id: string;
  sheet_id: string;
  number: number;
  reason: string;
  inputs: unknown;
  results: unknown;
  blocks: unknown;
  engine: string;
  digest: string;
  originator_id: string;
  frozen_at: Date;
}

/** A revision with the sheet and job it belongs to and the people behind it. */
export interface RevisionLine extends RevisionRow {
  sheet_number: number;
  title: string;
  job_id: string;
  originator: string;
  originator_name: string;
  check_id: string | null;
  check_state: 'open' | 'agreed' | 'returned' | 'void' | null;
  checker: string | null;
  checked_at: Date | null;
}

const lines = (db: Knex) =>
  db('revisions as r')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .join('people as o', 'o.id', 'r.originator_id')
    .leftJoin('checks as c', 'c.revision_id', 'r.id')
    .leftJoin('people as k', 'k.id', 'c.checker_id')
    .select(
      'r.*',
      's.number as sheet_number',
      's.title',
      's.job_id',
      'o.initials as originator',
      'o.name as originator_name',
      'c.id as check_id',
      'c.state as check_state',
      'c.closed_at as checked_at',
      'k.initials as checker',
    );

export async function revisionById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<RevisionLine | undefined> {
  return lines(db).where({ 'r.office_id': officeId, 'r.id': id }).first();
}

export async function revisionsOfSheet(db: Knex, officeId: string, sheetId: string): Promise<RevisionLine[]> {
  return lines(db).where({ 'r.office_id': officeId, 'r.sheet_id': sheetId }).orderBy('r.number', 'desc');
}

export async function revisionsOfSubmittal(
  db: Knex,
  officeId: string,
  submittalId: string,
): Promise<RevisionLine[]> {
  return lines(db)
    .join('submittal_revisions as sr', 'sr.revision_id', 'r.id')
    .where({ 'r.office_id': officeId, 'sr.submittal_id': submittalId })
    .orderBy('sr.position');
}

export async function insertRevision(trx: Knex, row: RevisionRow): Promise<void> {
  const { inputs, results, blocks, ...plain } = row;
  await trx('revisions').insert({
    ...plain,
    inputs: JSON.stringify(inputs),
    results: JSON.stringify(results),
    blocks: JSON.stringify(blocks),
  });
}

export async function nextRevision(db: Knex, officeId: string, sheetId: string): Promise<number> {
  const row = await db('revisions')
    .where({ office_id: officeId, sheet_id: sheetId })
    .max({ n: 'number' })
    .first();
  return row?.n === null || row?.n === undefined ? 0 : Number(row.n) + 1;
}
