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

/** Checks of earlier revisions lose their force when a sheet changes. Answers the checkers whose checks these were. */
export async function voidChecksOfSheet(
  trx: Knex.Transaction,
  officeId: string,
  sheetId: string,
): Promise<string[]> {
  const standing: { id: string; checker_id: string }[] = await trx('checks as c')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .where({ 'c.office_id': officeId, 'r.sheet_id': sheetId })
    .whereNot({ 'c.state': 'void' })
    .forUpdate()
    .select('c.id', 'c.checker_id');
  if (standing.length > 0) {
    const ids = standing.map((c) => c.id);
    await trx('checks').where({ office_id: officeId }).whereIn('id', ids).update({ state: 'void' });
  }
  return [...new Set(standing.map((c) => c.checker_id))];
}

/** Of these revisions those whose check is not agreed; checks that are agreed cannot change until the transaction ends. */
export async function uncheckedOf(
  trx: Knex.Transaction,
  officeId: string,
  revisionIds: readonly string[],
): Promise<string[]> {
  const agreed: string[] = await trx('checks')
    .where({ office_id: officeId, state: 'agreed' })
    .whereIn('revision_id', revisionIds)
    .forShare()
    .pluck('revision_id');
  return revisionIds.filter((id) => !agreed.includes(id));
}

/** The marks of a check, each with its newest answer. */
export async function marksOf(db: Knex, officeId: string, checkId: string): Promise<MarkRow[]> {
  return db('marks as m')
    .where({ 'm.office_id': officeId, 'm.check_id': checkId })
    .orderBy('m.at')
    .select(
      'm.*',
      db.raw(
        '(SELECT a.text FROM mark_answers a WHERE a.mark_id = m.id ORDER BY a.id DESC LIMIT 1) AS answer',
      ),
    );
}

export async function insertMark(trx: Knex, row: Omit<MarkRow, 'answer'>): Promise<void> {
  await trx('marks').insert(row);
}

/** A mark with the check it belongs to and the originator who may answer it. */
export async function markById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<
  | {
      id: string;
      line: string;
      check_id: string;
      check_state: CheckRow['state'];
      originator_id: string;
      job_id: string;
    }
  | undefined
> {
  return db('marks as m')
    .join('checks as c', 'c.id', 'm.check_id')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .where({ 'm.office_id': officeId, 'm.id': id })
    .first('m.id', 'm.line', 'm.check_id', 'c.state as check_state', 'r.originator_id', 's.job_id');
}

export async function insertMarkAnswer(
  trx: Knex,
  row: { office_id: string; mark_id: string; text: string; person_id: string; at: Date },
): Promise<void> {
  await trx('mark_answers').insert(row);
}

export async function removeMark(trx: Knex, officeId: string, checkId: string, line: string): Promise<void> {
  await trx('marks').where({ office_id: officeId, check_id: checkId, line }).delete();
}
