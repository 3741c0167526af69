import { afterAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { answerMark } from '@/lib/services/answer-mark';
import { concludeCheck } from '@/lib/services/conclude-check';
import { addSheet } from '@/lib/services/create-sheet';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { inTransaction } from '@/lib/services/in-transaction';
import { keepDraft } from '@/lib/services/keep-draft';
import { listJobs } from '@/lib/services/list-jobs';
import { markLine } from '@/lib/services/mark-line';
import { openJob } from '@/lib/services/open-job';
import { openSheet } from '@/lib/services/open-sheet';
import { sendToCheck } from '@/lib/services/send-to-check';
import { NotAllowed, NotFound } from '@/lib/services/service-error';
import { settleMark } from '@/lib/services/settle-mark';
import { verifyAudit } from '@/lib/services/verify-audit';
import { makeJob, makeOffice, need } from './office-factory';
import { checkedSheet, frozenSheet, makeSheet, proppedDraft } from './sheet-factory';

afterAll(() => database().destroy());

describe('the numbers of sheets', () => {
  it('are given once, also when ten are made at the same instant', async () => {
    const office = await makeOffice();
    const jobId = await makeJob(office);
    const draft = proppedDraft();
    await Promise.all(
      Array.from({ length: 10 }, () =>
        addSheet(office.people.engineer, jobId, draft.title, draft, 'made sheet'),
      ),
    );
    const { sheets } = await openJob(office.people.engineer, jobId);
    expect(sheets.map((s) => s.number)).toEqual(
      ['01', '02', '03', '04', '05', '06', '07', '08', '09', '10'].map((n) => `S-${n}`),
    );
  });
});

describe('two people at one draft', () => {
  it('never overwrite each other: the second is shown what stands there', async () => {
    const office = await makeOffice();
    const sheetId = await makeSheet(office, await makeJob(office));
    const { engineer, engineerOfRecord } = office.people;
    const mine = await keepDraft(engineer, { sheetId, version: 1, draft: proppedDraft('Mine') });
    const theirs = await keepDraft(engineerOfRecord, { sheetId, version: 1, draft: proppedDraft('Theirs') });
    expect(mine.ok).toBe(true);
    expect(theirs).toMatchObject({ ok: false, version: 2, by: engineer.name });
    expect((await openSheet(engineer, sheetId)).draft.title).toBe('Mine');
  });

  it('of ten that keep at once on one version, one is kept', async () => {
    const office = await makeOffice();
    const sheetId = await makeSheet(office, await makeJob(office));
    const answers = await Promise.all(
      Array.from({ length: 10 }, (_, i) =>
        keepDraft(office.people.engineer, { sheetId, version: 1, draft: proppedDraft(`T${i}`) }),
      ),
    );
    expect(answers.filter((a) => a.ok)).toHaveLength(1);
  });
});

describe('a frozen revision', () => {
  it('cannot be changed or deleted, whoever tries', async () => {
    const office = await makeOffice();
    const { revisionId } = await frozenSheet(office, await makeJob(office));
    const rows = () => database()('revisions').where({ id: revisionId });
    await expect(rows().update({ reason: 'other' })).rejects.toThrow('frozen');
    await expect(rows().delete()).rejects.toThrow('frozen');
  });

  it('is numbered 0, 1, 2 also when three freeze at once', async () => {
    const office = await makeOffice();
    const sheetId = await makeSheet(office, await makeJob(office));
    await Promise.all(
      [1, 2, 3].map((n) => freezeSheet(office.people.engineer, { sheetId, reason: `Issue ${n}` })),
    );
    const rows = await database()('revisions').where({ sheet_id: sheetId }).orderBy('number').pluck('number');
    expect(rows).toEqual([0, 1, 2]);
  });

  it('is not made of a draft that cannot be solved, and says why', async () => {
    const office = await makeOffice();
    const draft = proppedDraft();
    if (draft.geometry.shape === 'beam') for (const s of draft.geometry.supports) s.kind = 'roller';
    const sheetId = await addSheet(
      office.people.engineer,
      await makeJob(office),
      'Sliding',
      draft,
      'made sheet',
    );
    const refused = await freezeSheet(office.people.engineer, { sheetId, reason: 'Try' });
    expect(refused.ok).toBe(false);
    if (!refused.ok) expect(refused.errors[0]?.message).toMatch(/sliding/);
  });
});

describe('checking', () => {
  it('is never done by the originator', async () => {
    const office = await makeOffice();
    const { revisionId } = await frozenSheet(office, await makeJob(office));
    await database()('people')
      .where({ id: office.people.engineer.personId })
      .update({ roles: JSON.stringify(['engineer', 'checker']) });
    const refused = await sendToCheck(office.people.engineer, {
      revisionId,
      checkerId: office.people.engineer.personId,
      category: 1,
    });
    expect(refused).toMatchObject({ ok: false, errors: [{ path: 'checkerId' }] });
  });

  it('waits for the answer to a correction before it agrees', async () => {
    const office = await makeOffice();
    const { checker, engineer } = office.people;
    const { revisionId } = await frozenSheet(office, await makeJob(office));
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    need(
      await markLine(checker, {
        checkId,
        line: '2.1',
        kind: 'correct',
        text: 'The span is 6.20 m on the drawing.',
      }),
    );
    expect((await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' })).ok).toBe(false);
    const [mark] = await database()('marks').where({ check_id: checkId });
    need(await answerMark(engineer, { markId: mark.id, answer: 'The drawing was revised; 6.00 m stands.' }));
    need(await settleMark(checker, { markId: mark.id, outcome: 'accepted' }));
    expect((await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' })).ok).toBe(true);
    expect((await concludeCheck(checker, { checkId, outcome: 'returned', note: 'again' })).ok).toBe(false);
  });

  it('loses its force when the sheet changes', async () => {
    const office = await makeOffice();
    const jobId = await makeJob(office);
    const { sheetId, checkId } = await checkedSheet(office, jobId);
    need(await freezeSheet(office.people.engineer, { sheetId, reason: 'Changed load.' }));
    const row = await database()('checks').where({ id: checkId }).first();
    expect(row.state).toBe('void');
    expect((await openJob(office.people.engineer, jobId)).sheets[0]?.state).toBe('frozen');
  });

  it('refuses the marks of anyone but its checker', async () => {
    const office = await makeOffice();
    const { checker, engineer } = office.people;
    const { revisionId } = await frozenSheet(office, await makeJob(office));
    const { checkId } = need(
      await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
    );
    await expect(markLine(engineer, { checkId, line: '1', kind: 'agrees', text: '' })).rejects.toBeInstanceOf(
      NotAllowed,
    );
    const other = { ...checker, personId: engineer.personId };
    await expect(markLine(other, { checkId, line: '1', kind: 'agrees', text: '' })).rejects.toBeInstanceOf(
      NotAllowed,
    );
  });
});

describe('another office', () => {
  it('sees nothing and changes nothing', async () => {
    const office = await makeOffice();
    const foreign = (await makeOffice()).people;
    const jobId = await makeJob(office);
    const { sheetId, revisionId } = await frozenSheet(office, jobId);
    await expect(openJob(foreign.engineer, jobId)).rejects.toBeInstanceOf(NotFound);
    await expect(openSheet(foreign.engineer, sheetId)).rejects.toBeInstanceOf(NotFound);
    await expect(freezeSheet(foreign.engineer, { sheetId, reason: 'Not mine' })).rejects.toBeInstanceOf(
      NotFound,
    );
    await expect(
      keepDraft(foreign.engineer, { sheetId, version: 1, draft: proppedDraft() }),
    ).rejects.toBeInstanceOf(NotFound);
    await expect(
      sendToCheck(foreign.engineer, { revisionId, checkerId: foreign.checker.personId, category: 1 }),
    ).rejects.toBeInstanceOf(NotFound);
    expect((await listJobs(foreign.engineer, {})).rows).toEqual([]);
  });
});

describe('the audit log', () => {
  it('is one chain, also of entries made at once', async () => {
    const office = await makeOffice();
    const jobId = await makeJob(office);
    await Promise.all([1, 2, 3, 4].map(() => makeSheet(office, jobId)));
    expect(need(await verifyAudit(office.people.administrator))).toEqual({ entries: 5, broken: undefined });
  });

  it('undoes a verb that left no entry', async () => {
    const office = await makeOffice();
    const who = { officeId: office.id, name: 'nobody' };
    const silent = inTransaction(who, async (trx) => {
      await trx('offices').where({ id: office.id }).update({ name: 'changed' });
    });
    await expect(silent).rejects.toThrow('no audit row');
    expect((await database()('offices').where({ id: office.id }).first()).name).not.toBe('changed');
  });

  it('cannot be changed in the database', async () => {
    const office = await makeOffice();
    await makeJob(office);
    await expect(
      database()('audit').where({ office_id: office.id }).update({ verb: 'nothing' }),
    ).rejects.toThrow('frozen');
  });
});
