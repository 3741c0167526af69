// server only
import { z } from 'zod';
import { authorityById, jobById } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { commentsOf, decisionOf, insertDecision, type ReviewLinkRow } from '@/db/queries/reviews';
import { setSubmittalState, submittalById } from '@/db/queries/submittals';
import { env } from '@/lib/env';
import { inTransaction } from './in-transaction';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ words: z.string().min(1, 'Choose a decision.').max(80) });

/** The decision in the authority's own words. It is recorded once; a second one is told of the first. */
export async function decideReview(link: ReviewLinkRow, raw: unknown): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { words } = parsed.data;
  return inTransaction(
    { officeId: link.office_id, person: link.reviewer },
    async (trx, record): Promise<Result<null>> => {
      const submittal = await submittalById(trx, link.office_id, link.submittal_id, true);
      const job = submittal && (await jobById(trx, link.office_id, submittal.job_id));
      if (!submittal || !job) throw new NotFound('submittal of a link');
      const name = `${job.number} submittal ${submittal.number}`;
      const authority = job.authority_id
        ? await authorityById(trx, link.office_id, job.authority_id)
        : undefined;
      if (authority && !authority.decisions.includes(words)) {
        await record('could not decide', name);
        return mend('words', 'This is not one of the decisions of the authority.');
      }
      const before = await decisionOf(trx, link.office_id, link.submittal_id);
      if (before) {
        await record('met an earlier decision', name);
        return mend('', `${before.author} recorded “${before.words}” already. The first decision stands.`);
      }
      await insertDecision(trx, {
        submittal_id: submittal.id,
        office_id: link.office_id,
        words,
        author: link.reviewer,
        at: new Date(),
      });
      await setSubmittalState(trx, link.office_id, submittal.id, 'decided');
      const comments = await commentsOf(trx, link.office_id, submittal.id);
      const sender = (await peopleOf(trx, link.office_id)).find((p) => p.id === submittal.created_by);
      if (sender) {
        await queueMail(trx, {
          officeId: link.office_id,
          submittalId: submittal.id,
          recipient: sender.email,
          subject: `${name}: ${words}`,
          body: `${sender.name},\n\n${link.reviewer} recorded a decision on ${name}: ${words}, with ${comments.length === 1 ? 'one comment' : `${comments.length} comments`}.\n\n${env().appUrl}/jobs/${job.id}/submittals/${submittal.id}\n`,
        });
      }
      await record('decided', `${name}: ${words}`);
      return done(null);
    },
  );
}
