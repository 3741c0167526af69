// server only
import { database } from '@/db/connection';
import { mailsOfSubmittal } from '@/db/queries/mails';
import type { Draft } from '@/lib/model/draft';
import type { Actor } from '../actor';
import { answerComment } from '../answer-comment';
import { commentOnReview } from '../comment-on-review';
import { concludeCheck } from '../conclude-check';
import { addSheet } from '../create-sheet';
import { createSubmittal } from '../create-submittal';
import { decideReview } from '../decide-review';
import { freezeSheet } from '../freeze-sheet';
import { keepDraft } from '../keep-draft';
import { markLine } from '../mark-line';
import { reviewDoor } from '../open-review';
import { openSubmittal } from '../open-submittal';
import { sendSubmittal } from '../send-submittal';
import { sendToCheck } from '../send-to-check';
import { need } from './need';
import { proppedBeam } from './propped-beam';
import { sealForDemo } from './seal-for-demo';

export interface DemoPeople {
  engineer: Actor;
  checker: Actor;
  engineerOfRecord: Actor;
}

/**
 * Fills a job in its second round, by the same verbs a person uses: the first issue was sealed, sent, commented on
 * and sent back; the comment is answered, and the next revision lies with the checker, who asks one thing.
 */
export async function fillAnsweredJob(jobId: string, people: DemoPeople): Promise<void> {
  const { engineer, checker, engineerOfRecord } = people;
  const first = proppedBeam('4.2 kN/m');
  const sheetId = await addSheet(engineer, jobId, first.title, first, 'made sheet');
  const { revisionId, checkId } = await freezeAndSend(people, sheetId, 'First issue, for permit.');
  need(
    await concludeCheck(checker, {
      checkId,
      outcome: 'agreed',
      note: 'Loads and spans held against A-110.',
    }),
  );

  const made = need(
    await createSubmittal(engineer, {
      jobId,
      purpose: 'for permit',
      remarks: '',
      revisionIds: [revisionId],
    }),
  );
  await sealForDemo(engineerOfRecord, made.id);
  const reviewer = { reviewer: 'Dana Pell', email: 'dana.pell@orrin.example', days: 60 };
  need(await sendSubmittal(engineer, { submittalId: made.id, ...reviewer }));
  const link = await linkOf(engineer.officeId, made.id);
  need(
    await commentOnReview(link, {
      revisionId,
      line: '1.3',
      text: 'The gallery holds book stacks. Use the live load of a stack room, or show why not.',
      code: 'Local code of the City of Orrin (invented), live loads',
    }),
  );
  need(await decideReview(link, { words: 'Revise and Resubmit' }));
  const [comment] = (await openSubmittal(engineer, made.id)).comments;
  if (!comment) throw new Error('the demo comment is missing');
  need(
    await answerComment(engineer, {
      commentId: comment.id,
      answer: 'Agreed. The live load is raised to that of a stack room in revision 1.',
    }),
  );

  await keepNext(engineer, sheetId, proppedBeam('12.6 kN/m'));
  const second = await freezeAndSend(people, sheetId, 'Live load raised, to comment 1.');
  need(
    await markLine(checker, {
      checkId: second.checkId,
      line: '1.3',
      kind: 'query',
      text: 'Does the drawing show the stacks over the whole span?',
    }),
  );
}

async function freezeAndSend(
  { engineer, checker }: DemoPeople,
  sheetId: string,
  reason: string,
): Promise<{ revisionId: string; checkId: string }> {
  const { revisionId } = need(await freezeSheet(engineer, { sheetId, reason }));
  const { checkId } = need(
    await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
  );
  return { revisionId, checkId };
}

async function keepNext(engineer: Actor, sheetId: string, draft: Draft): Promise<void> {
  const kept = await keepDraft(engineer, { sheetId, version: 1, draft });
  if (!kept.ok) throw new Error('the demo draft was changed by somebody else');
}

/** The reviewer's link, read from the letter that carries it. */
async function linkOf(officeId: string, submittalId: string) {
  const letters = await mailsOfSubmittal(database(), officeId, submittalId);
  const token = letters.map((m) => /\/review\/(\S+)/.exec(m.body)?.[1]).find(Boolean);
  const door = await reviewDoor(token as string, 'demo');
  if (!door.open) throw new Error(`the link of the demo is ${door.why}`);
  return door.link;
}
