import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { changeOffice } from '@/lib/services/change-office';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { concludeCheck } from '@/lib/services/conclude-check';
import { myWork } from '@/lib/services/my-work';
import { revokeReview } from '@/lib/services/revoke-review';
import { sendToCheck } from '@/lib/services/send-to-check';
import { setJobState } from '@/lib/services/set-job-state';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet, frozenSheet } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
});

const texts = (work: { text: string }[]) => work.map((w) => w.text);
const later = (days: number) => new Date(Date.now() + days * 86_400_000);

describe('the work list', () => {
  it('gives a sheet in checking to its checker, and lets its originator wait for it', async () => {
    const { engineer, checker } = office.people;
    const { revisionId, sheetId } = await frozenSheet(office, jobId);
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    expect(await myWork(checker)).toMatchObject({
      toDo: [{ text: 'Check S-01 Propped beam', href: `/jobs/${jobId}/checks/${checkId}`, late: false }],
      waiting: [],
    });
    expect(texts((await myWork(engineer)).waiting)).toEqual(['S-01 Propped beam is with Che Ker to check']);
    need(await concludeCheck(checker, { checkId, outcome: 'returned', note: 'The span is 6.2 m.' }));
    expect(texts((await myWork(checker)).toDo)).toEqual([]);
    expect((await myWork(engineer)).toDo).toMatchObject([
      { text: 'Correct S-01 Propped beam, returned by Che Ker', href: `/jobs/${jobId}/sheets/${sheetId}` },
    ]);
  });

  it('calls late what waits longer than the office allows', async () => {
    const { administrator, engineer, checker } = office.people;
    const { revisionId } = await frozenSheet(office, jobId);
    need(await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }));
    need(await changeOffice(administrator, { lateAfter: '4' }));
    const lateAt = async (days: number) => (await myWork(checker, later(days))).toDo.map((w) => w.late);
    expect(await lateAt(4)).toEqual([false]);
    expect(await lateAt(5)).toEqual([true]);
    expect((await changeOffice(administrator, { lateAfter: 'soon' })).ok).toBe(false);
  });

  it('follows a submittal from the seal to the answer of its comments', async () => {
    const { engineer, engineerOfRecord } = office.people;
    const { revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    expect(texts((await myWork(engineerOfRecord)).toDo)).toEqual(['Seal submittal 1']);
    expect(texts((await myWork(engineer)).waiting)).toEqual([
      'Submittal 1 waits for the seal of Tomas Lindqvist',
    ]);
    await sealSubmittal(office, submittalId);
    expect(texts((await myWork(engineer)).toDo)).toEqual(['Send submittal 1, sealed']);
    const link = await reviewLinkOf(await sendTo(office, submittalId));
    expect(texts((await myWork(engineer)).waiting)).toEqual(['Submittal 1 is with the reviewer']);
    need(await commentOnReview(link, { revisionId, line: '2.1', text: 'Name the drawing.', code: '' }));
    expect(texts((await myWork(engineer)).toDo)).toEqual(['Answer one comment on submittal 1']);
  });

  it('says when nobody can open what was sent, and when a letter was refused', async () => {
    const { engineer } = office.people;
    const { revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, submittalId);
    await sendTo(office, submittalId);
    expect((await myWork(engineer, later(31))).toDo).toMatchObject([
      { text: 'Nobody can open submittal 1: no link to it is good', late: true },
    ]);
    need(await revokeReview(engineer, { submittalId }));
    expect(texts((await myWork(engineer)).toDo)).toEqual([
      'Nobody can open submittal 1: no link to it is good',
    ]);
    await database()('mails').where({ submittal_id: submittalId }).update({ state: 'refused' });
    expect((await myWork(engineer)).toDo).toMatchObject([
      { text: 'A letter with submittal 1 was refused', late: true },
    ]);
  });

  it('leaves out a job that is closed', async () => {
    const { engineer, checker } = office.people;
    const { revisionId } = await frozenSheet(office, jobId);
    need(await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }));
    need(await setJobState(engineer, { jobId, state: 'closed' }));
    expect(await myWork(checker)).toEqual({ toDo: [], waiting: [] });
  });
});
