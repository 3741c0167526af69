// server only
import type { Knex } from 'knex';

export interface ReviewLinkRow {
  id: string;
  office_id: string;
  submittal_id: string;
  reviewer: string;
  email: string;
  expires_at: Date;
  revoked_at: Date | null;
  opened_at: Date | null;
}

export async function insertReviewLink(trx: Knex, row: ReviewLinkRow): Promise<void> {
  await trx('review_links').insert(row);
}

export async function reviewLink(db: Knex, id: string): Promise<ReviewLinkRow | undefined> {
  return db('review_links').where({ id }).first();
}

export async function reviewLinksOf(
  db: Knex,
  officeId: string,
  submittalId: string,
): Promise<ReviewLinkRow[]> {
  return db('review_links').where({ office_id: officeId, submittal_id: submittalId }).orderBy('expires_at');
}

export async function noteOpened(trx: Knex, id: string, at: Date): Promise<number> {
  return trx('review_links').where({ id }).whereNull('opened_at').update({ opened_at: at });
}

/** Revokes the links of a submittal that still stand, or one of them. */
export async function revokeLinks(
  trx: Knex,
  officeId: string,
  submittalId: string,
  at: Date,
  linkId?: string,
): Promise<number> {
  return trx('review_links')
    .where({ office_id: officeId, submittal_id: submittalId, ...(linkId ? { id: linkId } : {}) })
    .whereNull('revoked_at')
    .update({ revoked_at: at });
}

export interface CommentRow {
  id: string;
  office_id: string;
  submittal_id: string;
  number: number;
  revision_id: string | null;
  line: string;
  code: string;
  text: string;
  author: string;
  at: Date;
}

/** A comment as it stands: open until it is answered; the reviewer accepts the answer or opens it again. */
export interface CommentLine extends CommentRow {
  state: 'open' | 'answered' | 'accepted' | 'reopened';
  /** The newest answer and the place that it names. */
  answer: string | null;
  place: string | null;
}

const newest = (column: string, kind = '') =>
  `(SELECT p.${column} FROM responses p WHERE p.comment_id = c.id ${kind} ORDER BY p.id DESC LIMIT 1)`;

const commentLines = (db: Knex) =>
  db('comments as c').select(
    'c.*',
    db.raw(`COALESCE(${newest('kind')}, 'open') AS state`),
    db.raw(`${newest('text', "AND p.kind = 'answered'")} AS answer`),
    db.raw(`${newest('place', "AND p.kind = 'answered'")} AS place`),
  );

export async function commentsOf(db: Knex, officeId: string, submittalId: string): Promise<CommentLine[]> {
  return commentLines(db)
    .where({ 'c.office_id': officeId, 'c.submittal_id': submittalId })
    .orderBy('c.number');
}

/** Every comment on any submittal of a job, with the number of its submittal. */
export async function commentsOfJob(
  db: Knex,
  officeId: string,
  jobId: string,
): Promise<(CommentLine & { submittal: number })[]> {
  return commentLines(db)
    .join('submittals as s', 's.id', 'c.submittal_id')
    .where({ 'c.office_id': officeId, 's.job_id': jobId })
    .orderBy(['s.number', 'c.number'])
    .select('s.number as submittal');
}

export async function commentById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<(CommentLine & { job_id: string }) | undefined> {
  return commentLines(db)
    .join('submittals as s', 's.id', 'c.submittal_id')
    .where({ 'c.office_id': officeId, 'c.id': id })
    .select('s.job_id')
    .first();
}

export interface ResponseRow {
  office_id: string;
  comment_id: string;
  kind: 'answered' | 'accepted' | 'reopened';
  text: string;
  place: string;
  author: string;
  at: Date;
}

export async function insertResponse(trx: Knex, row: ResponseRow): Promise<void> {
  await trx('responses').insert(row);
}

/** All that was said under a comment, in order. */
export async function responsesOf(db: Knex, officeId: string, commentId: string): Promise<ResponseRow[]> {
  return db('responses').where({ office_id: officeId, comment_id: commentId }).orderBy('id');
}

/** Numbers comments under the lock of their submittal, so that two at once get two numbers. */
export async function insertComment(trx: Knex.Transaction, row: Omit<CommentRow, 'number'>): Promise<number> {
  await trx('submittals').where({ office_id: row.office_id, id: row.submittal_id }).forUpdate().first('id');
  const last = await trx('comments')
    .where({ office_id: row.office_id, submittal_id: row.submittal_id })
    .max({ n: 'number' })
    .first();
  const number = last?.n === null || last?.n === undefined ? 1 : Number(last.n) + 1;
  await trx('comments').insert({ ...row, number });
  return number;
}

export async function decisionOf(
  db: Knex,
  officeId: string,
  submittalId: string,
): Promise<{ words: string; author: string; at: Date } | undefined> {
  return db('decisions').where({ office_id: officeId, submittal_id: submittalId }).first();
}

export async function insertDecision(
  trx: Knex,
  row: { submittal_id: string; office_id: string; words: string; author: string; at: Date },
): Promise<void> {
  await trx('decisions').insert(row);
}

export interface RegisterRow extends CommentLine {
  submittal: number;
  sheet: number | null;
  revision: number | null;
  decision: string | null;
}

/** Every comment on any submittal of a job with the sheet and revision it is about and the decision of its round. */
export async function commentRegister(db: Knex, officeId: string, jobId: string): Promise<RegisterRow[]> {
  return commentLines(db)
    .join('submittals as s', 's.id', 'c.submittal_id')
    .leftJoin('revisions as r', 'r.id', 'c.revision_id')
    .leftJoin('sheets as t', 't.id', 'r.sheet_id')
    .leftJoin('decisions as d', 'd.submittal_id', 's.id')
    .where({ 'c.office_id': officeId, 's.job_id': jobId })
    .orderBy(['s.number', 'c.number'])
    .select('s.number as submittal', 't.number as sheet', 'r.number as revision', 'd.words as decision');
}

/** All that was said under the comments of a job, in order. */
export async function responsesOfJob(db: Knex, officeId: string, jobId: string): Promise<ResponseRow[]> {
  return db('responses as p')
    .join('comments as c', 'c.id', 'p.comment_id')
    .join('submittals as s', 's.id', 'c.submittal_id')
    .where({ 'p.office_id': officeId, 's.job_id': jobId })
    .orderBy('p.id')
    .select('p.*');
}
