// server only
import type { Knex } from 'knex';

export interface CheckRow {
  id: string;
  office_id: string;
  revision_id: string;
  checker_id: string;
  category: number;
  state: 'open' | 'agreed' | 'returned' | 'void';
  note: string;
  opened_at: Date;
  closed_at: Date | null;
}

export interface MarkRow {
  id: string;
  office_id: string;
  check_id: string;
  line: string;
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  answer: string | null;
  at: Date;
}

export async function insertCheck(trx: Knex, row: CheckRow): Promise<void> {
  await trx('checks').insert(row);
}

export async function checkById(
  db: Knex,
  officeId: string,
  id: string,
  lock = false,
): Promise<CheckRow | undefined> {
  const query = db('checks').where({ office_id: officeId, id });
  return (lock ? query.forUpdate() : query).first();
}

export async function closeCheck(
  trx: Knex,
  officeId: string,
  id: string,
  state: 'agreed' | 'returned',
  note: string,
  at: Date,
): Promise<void> {
  await trx('checks').where({ office_id: officeId, id }).update({ state, note, closed_at: at });
}

/** Checks of earlier revisions lose their force when a sheet changes. */
export async function voidChecksOfSheet(trx: Knex, officeId: string, sheetId: string): Promise<number> {
  const earlier = trx('revisions').where({ sheet_id: sheetId }).select('id');
  return trx('checks')
    .where({ office_id: officeId })
    .whereIn('revision_id', earlier)
    .whereNot({ state: 'void' })
    .update({ state: 'void' });
}

export async function openChecksOf(
  db: Knex,
  officeId: string,
  checkerId: string,
): Promise<{ id: string; job_id: string; number: number; title: string; job_title: string }[]> {
  return db('checks as c')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .join('jobs as j', 'j.id', 's.job_id')
    .where({ 'c.office_id': officeId, 'c.checker_id': checkerId, 'c.state': 'open' })
    .select('c.id', 's.job_id', 's.number', 's.title', 'j.title as job_title');
}

export async function marksOf(db: Knex, officeId: string, checkId: string): Promise<MarkRow[]> {
  return db('marks').where({ office_id: officeId, check_id: checkId }).orderBy('at');
}

export async function insertMark(trx: Knex, row: MarkRow): Promise<void> {
  await trx('marks').insert(row);
}

export async function answerMark(trx: Knex, officeId: string, id: string, answer: string): Promise<number> {
  return trx('marks').where({ office_id: officeId, id }).update({ answer });
}

export async function removeMark(trx: Knex, officeId: string, checkId: string, line: string): Promise<void> {
  await trx('marks').where({ office_id: officeId, check_id: checkId, line }).delete();
}
