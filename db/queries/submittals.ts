// server only
import type { Knex } from 'knex';

export interface SubmittalRow {
  id: string;
  office_id: string;
  job_id: string;
  number: number;
  purpose: string;
  remarks: string;
  state: 'drafted' | 'sealed' | 'sent' | 'decided' | 'void';
  pages: number;
  created_by: string;
  created_at: Date;
  /** The engineer of record named on its cover, who alone seals it. */
  engineer_id: string;
  void_reason: string | null;
}

export async function submittalsOf(
  db: Knex,
  officeId: string,
  jobId: string,
): Promise<(SubmittalRow & { decision: string | null })[]> {
  return db('submittals as s')
    .leftJoin('decisions as d', 'd.submittal_id', 's.id')
    .where({ 's.office_id': officeId, 's.job_id': jobId })
    .orderBy('s.number')
    .select('s.*', 'd.words as decision');
}

export async function submittalById(
  db: Knex,
  officeId: string,
  id: string,
  lock = false,
): Promise<SubmittalRow | undefined> {
  const query = db('submittals').where({ office_id: officeId, id });
  return (lock ? query.forUpdate() : query).first();
}

export async function insertSubmittal(
  trx: Knex,
  row: SubmittalRow,
  revisionIds: readonly string[],
): Promise<void> {
  await trx('submittals').insert(row);
  const rows = revisionIds.map((revision_id, position) => ({
    submittal_id: row.id,
    revision_id,
    office_id: row.office_id,
    position,
  }));
  await trx('submittal_revisions').insert(rows);
}

export async function setSubmittalState(
  trx: Knex,
  officeId: string,
  id: string,
  state: SubmittalRow['state'],
): Promise<void> {
  await trx('submittals').where({ office_id: officeId, id }).update({ state });
}

/** Submittals that hold a revision of this sheet; their rows are locked. */
export async function submittalsWithSheet(
  trx: Knex.Transaction,
  officeId: string,
  sheetId: string,
): Promise<SubmittalRow[]> {
  // Joined and not asked in a subquery, which would read past the lock.
  const rows: SubmittalRow[] = await trx('submittals as s')
    .join('submittal_revisions as sr', 'sr.submittal_id', 's.id')
    .join('revisions as r', 'r.id', 'sr.revision_id')
    .where({ 's.office_id': officeId, 'r.sheet_id': sheetId })
    .forUpdate()
    .select('s.*');
  return [...new Map(rows.map((s) => [s.id, s])).values()];
}

export async function voidSubmittal(trx: Knex, officeId: string, id: string, reason: string): Promise<void> {
  await trx('submittals').where({ office_id: officeId, id }).update({ state: 'void', void_reason: reason });
  await trx('prepared_seals').where({ office_id: officeId, submittal_id: id }).delete();
}

export interface FileRow {
  id: string;
  office_id: string;
  submittal_id: string;
  kind: 'unsigned' | 'sealed';
  bytes: Buffer;
  sha256: string;
  made_at: Date;
  signed_by: string | null;
}

export async function insertFile(trx: Knex, row: FileRow): Promise<void> {
  await trx('files').insert(row);
}

export async function fileOf(
  db: Knex,
  officeId: string,
  submittalId: string,
  kind: FileRow['kind'],
): Promise<FileRow | undefined> {
  return db('files').where({ office_id: officeId, submittal_id: submittalId, kind }).first();
}

export interface PreparedSealRow {
  id: string;
  office_id: string;
  submittal_id: string;
  person_id: string;
  licence_id: string;
  bytes: Buffer;
  hole: unknown;
  expires_at: Date;
}

export async function insertPreparedSeal(trx: Knex, row: PreparedSealRow): Promise<void> {
  await trx('prepared_seals').insert({ ...row, hole: JSON.stringify(row.hole) });
}

export async function preparedSealById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<PreparedSealRow | undefined> {
  return db('prepared_seals').where({ office_id: officeId, id }).first();
}

export async function dropPreparedSeals(trx: Knex, officeId: string, submittalId: string): Promise<void> {
  await trx('prepared_seals').where({ office_id: officeId, submittal_id: submittalId }).delete();
}

export interface TransmittalRow {
  id: string;
  office_id: string;
  job_id: string;
  submittal_id: string;
  number: number;
  recipient: string;
  contents: string;
  /** What the authority is asked to do. */
  action: string;
  /** The authority's list, each line ticked off before sending. */
  seen_to: string[];
  /** Whether the sealed file went with the letter. */
  attached: boolean;
  sent_by: string;
  sent_at: Date;
}

export async function transmittalsOf(
  db: Knex,
  officeId: string,
  submittalId: string,
): Promise<TransmittalRow[]> {
  return db('transmittals').where({ office_id: officeId, submittal_id: submittalId }).orderBy('number');
}

export async function nextTransmittal(trx: Knex, officeId: string, jobId: string): Promise<number> {
  await trx('jobs').where({ office_id: officeId, id: jobId }).forUpdate().first('id');
  const row = await trx('transmittals')
    .where({ office_id: officeId, job_id: jobId })
    .max({ n: 'number' })
    .first();
  return row?.n === null || row?.n === undefined ? 1 : Number(row.n) + 1;
}

export async function insertTransmittal(trx: Knex, row: TransmittalRow): Promise<void> {
  await trx('transmittals').insert({ ...row, seen_to: JSON.stringify(row.seen_to) });
}
