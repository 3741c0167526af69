// server only
import type { Knex } from 'knex';

/** What followed a mark, oldest first. */
export type MarkStep = 'answered' | 'accepted' | 'reopened' | 'verified' | 'carried';

export interface CheckRow {
  id: string;
  office_id: string;
  revision_id: string;
  checker_id: string;
  category: number;
  state: 'open' | 'agreed' | 'returned' | 'void';
  /** The standard solution that a check of category 0 is held against; blank in the others. */
  standard_solution: string;
  /** Whether every input is to be held against a drawing before the sheet is agreed; 0 or 1. */
  inputs_asked: number;
  /** Whether the checker works without the designer's sheet until their own stands beside it; 0 or 1. */
  blind: number;
  /** What the checker declared when the check was concluded. */
  declaration: string;
  note: string;
  opened_at: Date;
  closed_at: Date | null;
}

export interface MarkRow {
  id: string;
  office_id: string;
  check_id: string;
  /** The line or figure by its number, or the input by its place in words. */
  line: string;
  /** A query of a checker who does not see the sheet is about the basis; its line says what about. */
  place: 'line' | 'input' | 'basis';
  kind: 'agrees' | 'correct' | 'query';
  text: string;
  /** The drawing that an input was held against. */
  drawing: string;
  answer: string | null;
  last_step: MarkStep | null;
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
  closing: { note: string; declaration: string; at: Date },
): Promise<void> {
  const { note, declaration, at } = closing;
  await trx('checks').where({ office_id: officeId, id }).update({ state, note, declaration, closed_at: at });
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

const lastStep =
  '(SELECT a.kind FROM mark_answers a WHERE a.mark_id = m.id ORDER BY a.id DESC LIMIT 1) AS last_step';

/** The marks of a check, each with its newest answer and the last step it took. */
export async function marksOf(db: Knex, officeId: string, checkId: string): Promise<MarkRow[]> {
  return db('marks as m')
    .where({ 'm.office_id': officeId, 'm.check_id': checkId })
    .orderBy('m.at')
    .select(
      'm.*',
      db.raw(
        "(SELECT a.text FROM mark_answers a WHERE a.mark_id = m.id AND a.kind = 'answered' ORDER BY a.id DESC LIMIT 1) AS answer",
      ),
      db.raw(lastStep),
    );
}

export async function insertMark(trx: Knex, row: Omit<MarkRow, 'answer' | 'last_step'>): Promise<void> {
  await trx('marks').insert(row);
}

/** A mark with the check it belongs to, its sheet, and the originator who may answer it. */
export interface MarkOfSheet {
  id: string;
  line: string;
  place: MarkRow['place'];
  kind: MarkRow['kind'];
  text: string;
  last_step: MarkStep | null;
  check_id: string;
  check_state: CheckRow['state'];
  checker_id: string;
  originator_id: string;
  revision: number;
  sheet_id: string;
  job_id: string;
}

const marksOfSheets = (db: Knex) =>
  db('marks as m')
    .join('checks as c', 'c.id', 'm.check_id')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .select(
      'm.id',
      'm.line',
      'm.place',
      'm.kind',
      'm.text',
      'm.check_id',
      'c.state as check_state',
      'c.checker_id',
      'r.originator_id',
      'r.number as revision',
      'r.sheet_id',
      's.job_id',
      db.raw(lastStep),
    );

export async function markById(db: Knex, officeId: string, id: string): Promise<MarkOfSheet | undefined> {
  return marksOfSheets(db).where({ 'm.office_id': officeId, 'm.id': id }).first();
}

/** Corrections and queries of earlier revisions that were neither settled then nor seen to since. */
export async function unsettledBefore(
  db: Knex,
  officeId: string,
  sheetId: string,
  revision: number,
): Promise<MarkOfSheet[]> {
  const marks = await marksOfSheets(db)
    .where({ 'm.office_id': officeId, 'r.sheet_id': sheetId })
    .where('r.number', '<', revision)
    .whereNot({ 'm.kind': 'agrees' })
    .orderBy(['r.number', 'm.at']);
  const settled: (MarkStep | null)[] = ['accepted', 'verified', 'carried'];
  return marks.filter((m: MarkOfSheet) => !settled.includes(m.last_step));
}

export interface MarkStepRow {
  office_id: string;
  mark_id: string;
  kind: MarkStep;
  text: string;
  person_id: string;
  /** The check of a later revision in which a correction was verified or carried on. */
  check_id: string | null;
  at: Date;
}

export async function insertMarkStep(trx: Knex, row: MarkStepRow): Promise<void> {
  await trx('mark_answers').insert(row);
}

/** Every step that the marks of a check took, oldest first, with who took it. */
export async function markStepsOf(
  db: Knex,
  officeId: string,
  checkId: string,
): Promise<(MarkStepRow & { name: string; initials: string })[]> {
  return db('mark_answers as a')
    .join('marks as m', 'm.id', 'a.mark_id')
    .join('people as p', 'p.id', 'a.person_id')
    .where({ 'a.office_id': officeId, 'm.check_id': checkId })
    .orderBy('a.id')
    .select('a.*', 'p.name', 'p.initials');
}

export async function removeMark(
  trx: Knex,
  officeId: string,
  at: Pick<MarkRow, 'check_id' | 'place' | 'line'>,
): Promise<void> {
  const { check_id, place, line } = at;
  await trx('marks').where({ office_id: officeId, check_id, place, line }).delete();
}
