// server only
import type { Knex } from 'knex';
import { type CommentLine, commentsOfJob } from '@/db/queries/reviews';
import type { SubmittalRow } from '@/db/queries/submittals';

/** Comments on earlier submittals of the job that wait for an answer, and so keep this one from going out. */
export async function blockingComments(
  db: Knex,
  submittal: Pick<SubmittalRow, 'office_id' | 'job_id' | 'number'>,
): Promise<(CommentLine & { submittal: number })[]> {
  return (await commentsOfJob(db, submittal.office_id, submittal.job_id)).filter(
    (c) => c.submittal < submittal.number && (c.state === 'open' || c.state === 'reopened'),
  );
}

/** Why nothing goes out, in words; nothing when nothing blocks. */
export function sayBlocking(waiting: readonly { number: number; submittal: number }[]): string | undefined {
  const [first] = waiting;
  if (!first) return undefined;
  const others = waiting.length === 1 ? '' : ` and ${waiting.length - 1} more`;
  const are = waiting.length === 1 ? 'is' : 'are';
  return `Comment ${first.number} on submittal ${first.submittal}${others} ${are} not answered yet. Answer first, then send.`;
}
