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

export async function revokeLinks(
  trx: Knex,
  officeId: string,
  submittalId: string,
  at: Date,
): Promise<number> {
  return trx('review_links')
    .where({ office_id: officeId, submittal_id: submittalId })
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
  answer: string | null;
}

export async function commentsOf(db: Knex, officeId: string, submittalId: string): Promise<CommentRow[]> {
  return db('comments').where({ office_id: officeId, submittal_id: submittalId }).orderBy('number');
}

/** Numbers comments under the lock of their submittal, so that two at once get two numbers. */
export async function insertComment(
  trx: Knex.Transaction,
  row: Omit<CommentRow, 'number' | 'answer'>,
): Promise<number> {
  await trx('submittals').where({ id: row.submittal_id }).forUpdate().first('id');
  const last = await trx('comments').where({ submittal_id: row.submittal_id }).max({ n: 'number' }).first();
  const number = last?.n === null || last?.n === undefined ? 1 : Number(last.n) + 1;
  await trx('comments').insert({ ...row, number });
  return number;
}

export async function answerComment(
  trx: Knex,
  officeId: string,
  id: string,
  answer: string,
): Promise<number> {
  return trx('comments').where({ office_id: officeId, id }).update({ answer });
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
