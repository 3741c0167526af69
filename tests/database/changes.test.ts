import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { concludeCheck } from '@/lib/services/conclude-check';
import { createSubmittal } from '@/lib/services/create-submittal';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { markLine } from '@/lib/services/mark-line';
import { openRevision } from '@/lib/services/open-revision';
import { openSubmittal } from '@/lib/services/open-submittal';
import { prepareSeal } from '@/lib/services/prepare-seal';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { sendToCheck } from '@/lib/services/send-to-check';
import { verifyRevision } from '@/lib/services/verify-revision';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet, frozenSheet } from './sheet-factory';
import { draftedSubmittal, sealSubmittal, sendTo } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
});

const freezeAgain = async (sheetId: string) =>
  need(await freezeSheet(office.people.engineer, { sheetId, reason: 'The load changed.' }));

const lettersTo = async (email: string): Promise<string[]> =>
  database()('mails').where({ recipient: email }).orderBy('next_try').pluck('subject');

describe('a new revision', () => {
  it('makes the open check of the earlier one void, and its checker can do nothing more with it', async () => {
    const { engineer, checker } = office.people;
    const { sheetId, revisionId } = await frozenSheet(office, jobId);
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    await freezeAgain(sheetId);
    const mark = await markLine(checker, { checkId, line: '1', kind: 'agrees', text: '' });
    const conclude = await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' });
    expect(mark).toMatchObject({ ok: false, errors: [{ code: 'check-void' }] });
    expect(conclude).toMatchObject({ ok: false, errors: [{ code: 'check-void' }] });
    const old = await openRevision(checker, revisionId);
    expect(old.check?.state).toBe('void');
    expect(old.newer).toMatchObject({ number: 1, reason: 'The load changed.' });
    expect((await openRevision(checker, old.newer?.id as string)).newer).toBeUndefined();
    expect(await lettersTo(checker.email)).toEqual([
      expect.stringMatching(/^To check/),
      expect.stringMatching(/S-01 revision 1 takes the place/),
    ]);
  });

  it('makes void a submittal that was gathered and not sealed, so that it cannot be sealed', async () => {
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await freezeAgain(sheetId);
    const sealing = await prepareSeal(office.people.engineerOfRecord, { submittalId });
    expect(sealing).toMatchObject({ ok: false, errors: [{ code: 'submittal-void' }] });
    const opened = await openSubmittal(office.people.engineer, submittalId);
    expect(opened.submittal).toMatchObject({ state: 'void', voidReason: 'S-01 revision 1 took its place' });
  });

  it('makes void a sealed submittal that was not sent; its sealed file stays readable', async () => {
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, submittalId);
    await freezeAgain(sheetId);
    const sending = { submittalId, reviewer: 'RR', email: 'r@x.example', days: 30 };
    expect(await sendSubmittal(office.people.engineer, sending)).toMatchObject({
      ok: false,
      errors: [{ code: 'submittal-void' }],
    });
    expect((await openSubmittal(office.people.engineer, submittalId)).file.kind).toBe('sealed');
    expect(await lettersTo(office.people.engineerOfRecord.email)).toHaveLength(1);
  });

  it('leaves a submittal that was sent as it was sent, and tells who sealed it', async () => {
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, submittalId);
    await sendTo(office, submittalId);
    await freezeAgain(sheetId);
    expect((await openSubmittal(office.people.engineer, submittalId)).submittal.state).toBe('sent');
    expect(await lettersTo(office.people.engineerOfRecord.email)).toHaveLength(1);
  });

  it('takes the old one out of new submittals and new checks', async () => {
    const { engineer, checker } = office.people;
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const unchecked = await frozenSheet(office, jobId);
    await freezeAgain(sheetId);
    await freezeAgain(unchecked.sheetId);
    const gather = { jobId, purpose: 'for permit', remarks: '', revisionIds: [revisionId] };
    expect(await createSubmittal(engineer, gather)).toMatchObject({
      ok: false,
      errors: [{ code: 'not-checked', path: 'revisionIds' }],
    });
    const check = { revisionId: unchecked.revisionId, checkerId: checker.personId, category: 1 };
    expect(await sendToCheck(engineer, check)).toMatchObject({ ok: false, errors: [{ code: 'superseded' }] });
  });

  it('leaves the old one whole: its digest is that of what is stored', async () => {
    const { sheetId, revisionId } = await frozenSheet(office, jobId);
    const next = await freezeAgain(sheetId);
    expect(await verifyRevision(office.people.checker, revisionId)).toBe(true);
    expect(await verifyRevision(office.people.checker, next.revisionId)).toBe(true);
  });
});
