import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { insertPerson } from '@/db/queries/people';
import type { Actor } from '@/lib/services/actor';
import { answerMark } from '@/lib/services/answer-mark';
import { changePerson } from '@/lib/services/change-person';
import { concludeCheck } from '@/lib/services/conclude-check';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { keepDraft } from '@/lib/services/keep-draft';
import { markLine } from '@/lib/services/mark-line';
import { openCheck } from '@/lib/services/open-check';
import type { Result } from '@/lib/services/result';
import { sendToCheck } from '@/lib/services/send-to-check';
import { NotAllowed } from '@/lib/services/service-error';
import { settleMark } from '@/lib/services/settle-mark';
import { verifyCorrection } from '@/lib/services/verify-correction';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { frozenSheet, proppedDraft } from './sheet-factory';

let office: Office;
let jobId: string;
let engineer: Actor;
let checker: Actor;
let sheetId: string;
let revisionId: string;

beforeAll(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ engineer, checker } = office.people);
}, 60_000);
beforeEach(async () => {
  ({ sheetId, revisionId } = await frozenSheet(office, jobId));
});
afterAll(() => database().destroy());

const codeOf = (result: Result<unknown>) => (result.ok ? 'done' : result.errors[0]?.code);
const send = (more: object = {}) =>
  sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1, ...more });
const agree = (checkId: string) => concludeCheck(checker, { checkId, outcome: 'agreed', note: '' });
const correct = async (checkId: string, line = '2.1') => {
  need(await markLine(checker, { checkId, line, kind: 'correct', text: 'The span is 6.2 m.' }));
  const mark = (await openCheck(checker, checkId)).marks.find((m) => m.line === line);
  return mark?.id as string;
};

/** A further checker of the office, free of any part. */
async function another(name: string): Promise<Actor> {
  const personId = crypto.randomUUID();
  const email = `${personId}@office.example`;
  const person = { id: personId, email, name, initials: 'NN', roles: ['engineer', 'checker'] };
  await insertPerson(database(), office.id, person);
  return { ...checker, personId, email, name, roles: ['engineer', 'checker'] };
}

// Rules of BS 5975-1:2024 categories 0 to 3, and of UFC 3-260-11FA: no portion computed and checked by the same person.
describe('the category of independence', () => {
  it('0 names the standard solution', async () => {
    expect(codeOf(await send({ category: 0 }))).toBe('no-standard');
    const sent = need(await send({ category: 0, standardSolution: 'Standard detail SD-12' }));
    expect((await openCheck(checker, sent.checkId)).check.standardSolution).toBe('Standard detail SD-12');
  });

  it('1 refuses whoever wrote in the sheet', async () => {
    const writer = await another('Wri Ter');
    need(await keepDraftAs(writer));
    expect(codeOf(await send({ checkerId: writer.personId }))).toBe('checker-wrote');
    expect(codeOf(await send())).toBe('done');
  });

  it('2 refuses whoever wrote in another sheet of the job, which 1 admits', async () => {
    const writer = await another('Wri Ter');
    const other = await frozenSheet(office, jobId);
    need(await keepDraftAs(writer, other.sheetId));
    expect(codeOf(await send({ checkerId: writer.personId, category: 2 }))).toBe('checker-involved');
    expect(codeOf(await send({ checkerId: writer.personId, category: 1 }))).toBe('done');
  });

  it('3 asks for another organisation', async () => {
    const outside = await another('Out Side');
    const ask = { checkerId: outside.personId, category: 3 };
    expect(codeOf(await send(ask))).toBe('same-organisation');
    const { name, initials, roles } = { ...outside, initials: 'OS' };
    const change = { personId: outside.personId, name, initials, roles, active: true };
    need(
      await changePerson(office.people.administrator, {
        ...change,
        organisation: 'Other Engineers (invented)',
      }),
    );
    expect(codeOf(await send(ask))).toBe('done');
  });
});

async function keepDraftAs(actor: Actor, sheet = sheetId): Promise<Result<null>> {
  const kept = await keepDraft(actor, { sheetId: sheet, version: 1, draft: proppedDraft() });
  return kept.ok ? { ok: true, value: null } : { ok: false, errors: [] };
}

describe('a mark', () => {
  it('goes from open to answered to opened again to accepted, with every step kept', async () => {
    const { checkId } = need(await send());
    const markId = await correct(checkId);
    expect(codeOf(await agree(checkId))).toBe('marks-open');
    expect(codeOf(await settleMark(checker, { markId, outcome: 'accepted' }))).toBe('not-answered');
    need(await answerMark(engineer, { markId, answer: 'It is 6.0 m on A-201.' }));
    expect(codeOf(await agree(checkId))).toBe('marks-open');
    expect(codeOf(await settleMark(checker, { markId, outcome: 'reopened' }))).not.toBe('done');
    need(await settleMark(checker, { markId, outcome: 'reopened', text: 'A-201 rev 2 says 6.2 m.' }));
    need(await answerMark(engineer, { markId, answer: 'Rev 3 says 6.0 m again.' }));
    need(await settleMark(checker, { markId, outcome: 'accepted' }));
    expect(codeOf(await answerMark(engineer, { markId, answer: 'more' }))).toBe('mark-settled');
    const [mark] = (await openCheck(engineer, checkId)).marks;
    expect(mark?.state).toBe('accepted');
    expect(mark?.steps.map((s) => s.kind)).toEqual(['answered', 'reopened', 'answered', 'accepted']);
    expect(codeOf(await agree(checkId))).toBe('done');
  });

  it('is settled by its own checker alone', async () => {
    const { checkId } = need(await send());
    const markId = await correct(checkId);
    need(await answerMark(engineer, { markId, answer: 'It is 6.0 m on A-201.' }));
    const stranger = { ...(await another('Other Checker')), roles: ['checker' as const] };
    await expect(settleMark(stranger, { markId, outcome: 'accepted' })).rejects.toBeInstanceOf(NotAllowed);
  });

  it('that was answered is not overwritten by a new one', async () => {
    const { checkId } = need(await send());
    const markId = await correct(checkId);
    need(await answerMark(engineer, { markId, answer: 'It is 6.0 m on A-201.' }));
    const over = await markLine(checker, { checkId, line: '2.1', kind: 'agrees', text: '' });
    expect(codeOf(over)).toBe('mark-answered');
  });

  it('stands at lines and inputs that the sheet has', async () => {
    const { checkId } = need(await send());
    for (const place of ['line', 'input'])
      expect(
        codeOf(await markLine(checker, { checkId, place, line: '99.9', kind: 'query', text: 'Where?' })),
      ).toBe('no-such-place');
  });
});

describe('inputs against drawings', () => {
  it('hold back the agreement until every one is held against a drawing that is named', async () => {
    const { checkId } = need(await send({ inputsAsked: true }));
    expect(codeOf(await agree(checkId))).toBe('inputs-open');
    const { inputs } = await openCheck(checker, checkId);
    expect(inputs.map((i) => i.place)).toEqual(['span 1', 'support 1', 'support 2', 'case G, load 1']);
    const mark = { checkId, place: 'input', kind: 'agrees', text: '' };
    expect(codeOf(await markLine(checker, { ...mark, line: 'span 1' }))).not.toBe('done');
    for (const { place } of inputs)
      need(await markLine(checker, { ...mark, line: place, drawing: 'A-201 rev 3' }));
    expect((await openCheck(checker, checkId)).inputs[0]?.mark?.drawing).toBe('A-201 rev 3');
    expect(codeOf(await agree(checkId))).toBe('done');
  });
});

describe('a correction that a returned sheet took along', () => {
  async function secondCheck(): Promise<{ first: string; second: string; markId: string }> {
    const { checkId: first } = need(await send());
    const markId = await correct(first);
    need(await concludeCheck(checker, { checkId: first, outcome: 'returned', note: '' }));
    need(await keepDraftAs(engineer));
    const next = need(await freezeSheet(engineer, { sheetId, reason: 'Span corrected.' }));
    const sent = await send({ revisionId: next.revisionId });
    return { first, second: need(sent).checkId, markId };
  }

  it('is verified in the check of the next revision', async () => {
    const { first, second, markId } = await secondCheck();
    expect((await openCheck(checker, second)).earlier.map((m) => m.where)).toEqual(['line 2.1']);
    expect(codeOf(await agree(second))).toBe('not-verified');
    need(await verifyCorrection(checker, { checkId: second, markId, outcome: 'verified' }));
    expect((await openCheck(checker, first)).marks[0]?.state).toBe('verified');
    expect(codeOf(await agree(second))).toBe('done');
  });

  it('is carried on as a mark of its own when it was not made', async () => {
    const { second, markId } = await secondCheck();
    need(await verifyCorrection(checker, { checkId: second, markId, outcome: 'carried' }));
    const { marks, earlier } = await openCheck(checker, second);
    expect(earlier).toEqual([]);
    expect(marks).toMatchObject([{ where: 'line 2.1', kind: 'correct', state: 'open' }]);
    expect(codeOf(await agree(second))).toBe('marks-open');
  });
});
