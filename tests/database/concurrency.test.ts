import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { completeSeal } from '@/lib/services/complete-seal';
import { concludeCheck } from '@/lib/services/conclude-check';
import { createSheet } from '@/lib/services/create-sheet';
import { createSubmittal } from '@/lib/services/create-submittal';
import { decideReview } from '@/lib/services/decide-review';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { invitePerson } from '@/lib/services/invite-person';
import { allowAttempt } from '@/lib/services/limit-attempts';
import { openReview } from '@/lib/services/open-review';
import { openSubmittal } from '@/lib/services/open-submittal';
import { prepareSeal } from '@/lib/services/prepare-seal';
import type { Result } from '@/lib/services/result';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { sendToCheck } from '@/lib/services/send-to-check';
import { walkAudit } from '@/lib/services/verify-audit';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet, frozenSheet, makeSheet } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo, signPrepared } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
});

/** Of answers given at the same instant: how many were good, and the codes of the refusals. */
function tally(answers: Result<unknown>[]): { good: number; codes: string[] } {
  const codes = answers.flatMap((a) => (a.ok ? [] : a.errors.map((e) => e.code)));
  return { good: answers.filter((a) => a.ok).length, codes };
}

async function sentSubmittal() {
  const { revisionId } = await checkedSheet(office, jobId);
  const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
  await sealSubmittal(office, submittalId);
  return { revisionId, submittalId, link: await reviewLinkOf(await sendTo(office, submittalId)) };
}

describe('at the same instant', () => {
  it('twelve writers in three jobs of one office all get through, and the record is one chain', async () => {
    const jobs = [jobId, await makeJob(office, '26-002'), await makeJob(office, '26-003')];
    const { engineer } = office.people;
    const answers = await Promise.all(
      jobs.flatMap((id) =>
        [1, 2, 3, 4].map((n) => createSheet(engineer, { jobId: id, start: 'beam', title: `T${n}` })),
      ),
    );
    expect(tally(answers)).toEqual({ good: 12, codes: [] });
    expect(await walkAudit(office.id)).toEqual({ entries: 15, broken: undefined });
  });

  it('two send one revision to check: one check is opened', async () => {
    const { engineer, engineerOfRecord, checker } = office.people;
    const { revisionId } = await frozenSheet(office, jobId);
    const input = { revisionId, checkerId: checker.personId, category: 1 };
    const answers = await Promise.all([engineer, engineerOfRecord].map((who) => sendToCheck(who, input)));
    expect(tally(answers)).toEqual({ good: 1, codes: ['with-a-checker'] });
  });

  it('a checker agrees and returns from two windows: the first stands', async () => {
    const { engineer, checker } = office.people;
    const { revisionId } = await frozenSheet(office, jobId);
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    const answers = await Promise.all(
      (['agreed', 'returned'] as const).map((outcome) =>
        concludeCheck(checker, { checkId, outcome, note: 'from this window' }),
      ),
    );
    expect(tally(answers)).toEqual({ good: 1, codes: ['check-closed'] });
  });

  it('a sheet is frozen anew and agreed: whichever comes first, the check is void in the end', async () => {
    const { engineer, checker } = office.people;
    const { sheetId, revisionId } = await frozenSheet(office, jobId);
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    await Promise.all([
      freezeSheet(engineer, { sheetId, reason: 'Changed.' }),
      concludeCheck(checker, { checkId, outcome: 'agreed', note: '' }),
    ]);
    expect((await database()('checks').where({ id: checkId }).first()).state).toBe('void');
  });

  it('a sheet is frozen anew and gathered: no submittal with an unchecked sheet stands', async () => {
    const { engineer, engineerOfRecord } = office.people;
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const gather = { jobId, purpose: 'for permit', remarks: '', revisionIds: [revisionId] };
    const [gathered] = await Promise.all([
      createSubmittal(engineer, gather),
      freezeSheet(engineer, { sheetId, reason: 'Changed.' }),
    ]);
    if (gathered.ok) {
      const submittalId = gathered.value.id;
      expect((await openSubmittal(engineer, submittalId)).submittal.state).toBe('void');
      expect((await prepareSeal(engineerOfRecord, { submittalId })).ok).toBe(false);
    } else expect(tally([gathered]).codes).toEqual(['not-checked']);
  });

  it('one submittal is sealed from two windows: one seal is stored', async () => {
    const { engineerOfRecord } = office.people;
    const { revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const prepared = [1, 2].map(async () => {
      const { preparedId, hole } = need(await prepareSeal(engineerOfRecord, { submittalId }));
      return { preparedId, cms: await signPrepared(engineerOfRecord, { preparedId, hole }) };
    });
    const both = await Promise.all(prepared);
    const answers = await Promise.all(both.map((p) => completeSeal(engineerOfRecord, p)));
    expect(tally(answers)).toEqual({ good: 1, codes: ['sealed-already'] });
    const files = await database()('files').where({ submittal_id: submittalId, kind: 'sealed' });
    expect(files).toHaveLength(1);
  });

  it('a submittal is sent three times: three transmittals, numbered 1, 2, 3', async () => {
    const { revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, submittalId);
    const input = { submittalId, reviewer: 'RR', email: 'r@x.example', days: 30 };
    await Promise.all([1, 2, 3].map(() => sendSubmittal(office.people.engineer, input)));
    const { transmittals, mails } = await openSubmittal(office.people.engineer, submittalId);
    expect(transmittals.map((t) => t.number)).toEqual([1, 2, 3]);
    expect(mails).toHaveLength(3);
  });

  it('two reviewers decide: the first decision stands, the second is told of it', async () => {
    const { link, submittalId } = await sentSubmittal();
    const answers = await Promise.all(
      ['Approved', 'Revise and Resubmit'].map((words) => decideReview(link, { words })),
    );
    expect(tally(answers)).toEqual({ good: 1, codes: ['decided'] });
    const told = answers.flatMap((a) => (a.ok ? [] : a.errors.map((e) => e.message)));
    expect(told[0]).toMatch(/first decision stands/);
    expect((await openSubmittal(office.people.engineer, submittalId)).submittal.state).toBe('decided');
  });

  it('six comments get six numbers', async () => {
    const { link, revisionId, submittalId } = await sentSubmittal();
    const comment = { revisionId, line: '2.1', text: 'Why?', code: '' };
    await Promise.all([1, 2, 3, 4, 5, 6].map(() => commentOnReview(link, comment)));
    const { comments } = await openSubmittal(office.people.engineer, submittalId);
    expect(comments.map((c) => c.number)).toEqual([1, 2, 3, 4, 5, 6]);
  });

  it('ten people open one link: all read it, the opening is recorded once', async () => {
    const { link } = await sentSubmittal();
    const read = await Promise.all(Array.from({ length: 10 }, () => openReview(link)));
    expect(read.every((r) => r.sheets.length === 1)).toBe(true);
    const entries = await database()('audit').where({ office_id: office.id, verb: 'opened the review' });
    expect(entries).toHaveLength(1);
  });

  it('one address is invited twice: one person is made, the other sender is told', async () => {
    const email = `${Math.random()}@x.example`;
    const person = { email, name: 'New Person', initials: 'NP', roles: ['engineer'] };
    const answers = await Promise.all([1, 2].map(() => invitePerson(office.people.administrator, person)));
    expect(tally(answers)).toEqual({ good: 1, codes: ['address-taken'] });
  });

  it('no more tries pass than are allowed', async () => {
    const subject = `many-${Math.random()}`;
    const passed = await Promise.all(Array.from({ length: 20 }, () => allowAttempt(subject, 5)));
    expect(passed.filter(Boolean).length).toBeLessThanOrEqual(5);
  });

  it('two keep the same sheet and freeze it: numbers and versions follow one another', async () => {
    const sheetId = await makeSheet(office, jobId);
    const { engineer, engineerOfRecord } = office.people;
    const answers = await Promise.all(
      [engineer, engineerOfRecord, engineer].map((who, i) =>
        freezeSheet(who, { sheetId, reason: `Issue ${i}` }),
      ),
    );
    expect(tally(answers)).toEqual({ good: 3, codes: [] });
    expect(
      await database()('revisions').where({ sheet_id: sheetId }).orderBy('number').pluck('number'),
    ).toEqual([0, 1, 2]);
  });
});
