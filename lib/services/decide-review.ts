// server only
import { z } from 'zod';
import { authorityById, jobById } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { commentsOf, decisionOf, insertDecision, type ReviewLinkRow } from '@/db/queries/reviews';
import { fileOf, setSubmittalState, submittalById } from '@/db/queries/submittals';
import { env } from '@/lib/env';
import { inTransaction } from './in-transaction';
import { type Result, unread } from './result';
import { reviewer } from './reviewer';
import { NotFound, refuse } from './service-error';
import { usualDecisions } from './usual-decisions';

const input = z.object({ words: z.string().min(1, 'Choose a decision.').max(80) });

/** The decision in the authority's own words. It is recorded once; a second one is told of the first. */
export async function decideReview(link: ReviewLinkRow, raw: unknown): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { words } = parsed.data;
  const { office_id: officeId, submittal_id: id } = link;
  return inTransaction(reviewer(link), async (trx, record) => {
    const submittal = await submittalById(trx, officeId, id, true);
    const job = submittal && (await jobById(trx, officeId, submittal.job_id));
    if (!submittal || !job) throw new NotFound('submittal of a link');
    const authority = job.authority_id ? await authorityById(trx, officeId, job.authority_id) : undefined;
    if (!(authority?.decisions ?? usualDecisions).includes(words))
      refuse('unknown-decision', 'words', 'This is not one of the decisions of the authority.');
    const before = await decisionOf(trx, officeId, id);
    if (before)
      refuse(
        'decided',
        '',
        `${before.author} recorded “${before.words}” already. The first decision stands.`,
      );
    const author = link.reviewer;
    await insertDecision(trx, { submittal_id: id, office_id: officeId, words, author, at: new Date() });
    await setSubmittalState(trx, officeId, id, 'decided');
    const name = `${job.number} submittal ${submittal.number}`;
    const comments = (await commentsOf(trx, officeId, id)).length;
    const count = comments === 1 ? 'one comment' : `${comments} comments`;
    const place = `${env().appUrl}/jobs/${job.id}/submittals/${id}`;
    for (const person of await peopleOf(trx, officeId)) {
      if (person.id !== submittal.created_by && person.id !== submittal.engineer_id) continue;
      await queueMail(trx, {
        officeId,
        submittalId: id,
        recipient: person.email,
        subject: `${name}: ${words}`,
        body: `${person.name},\n\n${author} recorded a decision on ${name}: ${words}, with ${count}.\n\n${place}\n`,
      });
    }
    const sealed = await fileOf(trx, officeId, id, 'sealed');
    const about = { digest: sealed?.sha256, jobId: job.id, aboutId: id };
    await record('decided', `${name}: ${words}`, about);
    return null;
  });
}
