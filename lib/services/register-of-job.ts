// server only
import type { Knex } from 'knex';
import { commentRegister, type RegisterRow, responsesOfJob } from '@/db/queries/reviews';
import type { AnsweredComment } from '@/templates/compose-responses';
import type { Actor } from './actor';
import { dayIn } from './day-in';
import { sheetName } from './sheet-state';

export interface RegisterEntry extends AnsweredComment {
  id: string;
  submittalId: string;
  at: Date;
}

/** The comments of all rounds of a job, each with all that was said under it. */
export async function registerOfJob(
  db: Knex,
  { officeId, zone }: Pick<Actor, 'officeId' | 'zone'>,
  jobId: string,
): Promise<RegisterEntry[]> {
  const day = (at: Date) => dayIn(zone, at);
  const comments = await commentRegister(db, officeId, jobId);
  const responses = await responsesOfJob(db, officeId, jobId);
  return comments.map((c) => ({
    id: c.id,
    submittalId: c.submittal_id,
    at: c.at,
    round: c.submittal,
    decision: c.decision,
    number: c.number,
    about: placeOf(c),
    code: c.code,
    text: c.text,
    author: c.author,
    date: day(c.at),
    state: c.state,
    said: responses
      .filter((r) => r.comment_id === c.id)
      .map((r) => ({ kind: r.kind, text: r.text, place: r.place, author: r.author, date: day(r.at) })),
  }));
}

function placeOf(c: RegisterRow): string {
  if (c.sheet === null || c.revision === null) return `line ${c.line}`;
  return `${sheetName(c.sheet)} revision ${c.revision}, line ${c.line}`;
}
