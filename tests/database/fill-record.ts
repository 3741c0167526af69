import type { ReviewLinkRow } from '@/db/queries/reviews';
import { answerComment } from '@/lib/services/answer-comment';
import { answerMark } from '@/lib/services/answer-mark';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { concludeCheck } from '@/lib/services/conclude-check';
import { decideReview } from '@/lib/services/decide-review';
import { markLine } from '@/lib/services/mark-line';
import { openRevision } from '@/lib/services/open-revision';
import { openSubmittal } from '@/lib/services/open-submittal';
import { sendToCheck } from '@/lib/services/send-to-check';
import { settleMark } from '@/lib/services/settle-mark';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { frozenSheet } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo } from './submittal-factory';

export interface Filled {
  office: Office;
  jobId: string;
  /** A frozen sheet that went to nobody. */
  frozen: { sheetId: string; revisionId: string };
  sent: {
    sheetId: string;
    revisionId: string;
    checkId: string;
    markId: string;
    submittalId: string;
    commentId: string;
    /** The letter with the link. */
    mailId: string;
    link: ReviewLinkRow;
  };
}

/** An office whose record has something of everything: a sheet checked, sealed, sent, commented, answered and decided. */
export async function fillRecord(): Promise<Filled> {
  const office = await makeOffice();
  const { engineer, checker } = office.people;
  const jobId = await makeJob(office);
  const frozen = await frozenSheet(office, jobId);
  const { sheetId, revisionId } = await frozenSheet(office, jobId);
  const { checkId } = need(
    await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
  );
  need(await markLine(checker, { checkId, line: '2.1', kind: 'query', text: 'Which drawing is this from?' }));
  const markId = (await openRevision(engineer, revisionId)).marks[0]?.id as string;
  need(await answerMark(engineer, { markId, answer: 'From A-201.' }));
  need(await settleMark(checker, { markId, outcome: 'accepted' }));
  need(await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' }));
  const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
  await sealSubmittal(office, submittalId);
  const link = await reviewLinkOf(await sendTo(office, submittalId));
  need(await commentOnReview(link, { revisionId, line: '2.1', text: 'Name the drawing.', code: '' }));
  const commentId = (await openSubmittal(engineer, submittalId)).comments[0]?.id as string;
  const mailId = (await openSubmittal(engineer, submittalId)).mails[0]?.id as string;
  need(await answerComment(engineer, { commentId, answer: 'It is A-201.', place: 'S-02.1' }));
  need(await decideReview(link, { words: 'Approved' }));
  return {
    office,
    jobId,
    frozen,
    sent: { sheetId, revisionId, checkId, markId, submittalId, commentId, mailId, link },
  };
}
