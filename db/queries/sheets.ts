// server only
import type { Knex } from 'knex';

export interface SheetRow {
  id: string;
  office_id: string;
  job_id: string;
  number: number;
  title: string;
  originator_id: string;
  changed_at: Date;
}

/** A sheet with its newest revision and the check of that revision. */
export interface SheetLine extends SheetRow {
  originator: string;
  revision_id: string | null;
  revision: number | null;
  frozen_at: Date | null;
  digest: string | null;
  check_id: string | null;
  check_state: 'open' | 'agreed' | 'returned' | 'void' | null;
  checker: string | null;
  checked_at: Date | null;
  draft_at: Date | null;
  sealed: number;
}

export async function sheetLines(
  db: Knex,
  officeId: string,
  jobIds: readonly string[],
): Promise<SheetLine[]> {
  const newest = db('revisions').select('sheet_id').max({ number: 'number' }).groupBy('sheet_id').as('n');
  const kept = db('drafts').select('sheet_id').max({ at: 'kept_at' }).groupBy('sheet_id').as('d');
  return db('sheets as s')
    .join('people as o', 'o.id', 's.originator_id')
    .leftJoin(newest, 'n.sheet_id', 's.id')
    .leftJoin('revisions as r', (on) => on.on('r.sheet_id', 's.id').andOn('r.number', 'n.number'))
    .leftJoin('checks as c', 'c.revision_id', 'r.id')
    .leftJoin('people as k', 'k.id', 'c.checker_id')
    .leftJoin(kept, 'd.sheet_id', 's.id')
    .where('s.office_id', officeId)
    .whereIn('s.job_id', jobIds)
    .orderBy('s.number')
    .select(
      's.*',
      'o.initials as originator',
      'r.id as revision_id',
      'r.number as revision',
      'r.frozen_at',
      'r.digest',
      'c.id as check_id',
      'c.state as check_state',
      'c.closed_at as checked_at',
      'k.initials as checker',
      'd.at as draft_at',
      db.raw(
        "EXISTS (SELECT 1 FROM submittal_revisions sr JOIN files f ON f.submittal_id = sr.submittal_id AND f.kind = 'sealed' WHERE sr.revision_id = r.id) AS sealed",
      ),
    );
}

export async function sheetById(db: Knex, officeId: string, id: string): Promise<SheetRow | undefined> {
  return db('sheets').where({ office_id: officeId, id }).first();
}

export async function insertSheet(trx: Knex, row: SheetRow): Promise<void> {
  await trx('sheets').insert(row);
}

export async function renameSheet(trx: Knex, officeId: string, id: string, title: string): Promise<void> {
  await trx('sheets').where({ office_id: officeId, id }).update({ title, changed_at: new Date() });
}

export interface DraftRow {
  version: number;
  body: unknown;
  kept_at: Date;
  kept_by: string;
  name: string;
}

/** The newest version of a draft; `lock` holds other writers back until the transaction ends. */
export async function newestDraft(
  db: Knex,
  officeId: string,
  sheetId: string,
  lock = false,
): Promise<DraftRow | undefined> {
  if (lock) await db('sheets').where({ office_id: officeId, id: sheetId }).forUpdate().first('id');
  return db('drafts as d')
    .join('people as p', 'p.id', 'd.kept_by')
    .where({ 'd.office_id': officeId, 'd.sheet_id': sheetId })
    .orderBy('d.version', 'desc')
    .first('d.version', 'd.body', 'd.kept_at', 'd.kept_by', 'p.name');
}

/** The versions of a draft, newest first, without their bodies. */
export async function draftVersions(
  db: Knex,
  officeId: string,
  sheetId: string,
  page: { size: number; offset: number },
): Promise<Omit<DraftRow, 'body'>[]> {
  return db('drafts as d')
    .join('people as p', 'p.id', 'd.kept_by')
    .where({ 'd.office_id': officeId, 'd.sheet_id': sheetId })
    .orderBy('d.version', 'desc')
    .limit(page.size)
    .offset(page.offset)
    .select('d.version', 'd.kept_at', 'd.kept_by', 'p.name');
}

export async function draftByVersion(
  db: Knex,
  officeId: string,
  sheetId: string,
  version: number,
): Promise<DraftRow | undefined> {
  return db('drafts as d')
    .join('people as p', 'p.id', 'd.kept_by')
    .where({ 'd.office_id': officeId, 'd.sheet_id': sheetId, 'd.version': version })
    .first('d.version', 'd.body', 'd.kept_at', 'd.kept_by', 'p.name');
}

export async function insertDraft(
  trx: Knex,
  row: { sheetId: string; officeId: string; version: number; body: unknown; by: string; at: Date },
): Promise<void> {
  await trx('drafts').insert({
    sheet_id: row.sheetId,
    office_id: row.officeId,
    version: row.version,
    body: JSON.stringify(row.body),
    kept_by: row.by,
    kept_at: row.at,
  });
}
