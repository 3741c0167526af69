import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import type { Actor } from '@/lib/services/actor';
import { beginOwnSheet } from '@/lib/services/begin-own-sheet';
import { compareOwnSheet } from '@/lib/services/compare-own-sheet';
import { concludeCheck } from '@/lib/services/conclude-check';
import { copySheet } from '@/lib/services/copy-sheet';
import { exportJob } from '@/lib/services/export/export-job';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { keepDraft } from '@/lib/services/keep-draft';
import { listDraftVersions } from '@/lib/services/list-draft-versions';
import { markLine } from '@/lib/services/mark-line';
import { openCheck } from '@/lib/services/open-check';
import { openDraftVersion } from '@/lib/services/open-draft-version';
import { openRevision } from '@/lib/services/open-revision';
import { openSheet } from '@/lib/services/open-sheet';
import type { Result } from '@/lib/services/result';
import { sendToCheck } from '@/lib/services/send-to-check';
import { NotAllowed } from '@/lib/services/service-error';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { frozenSheet, proppedDraft } from './sheet-factory';

let office: Office;
let jobId: string;
let engineer: Actor;
let checker: Actor;
let sheetId: string;
let revisionId: string;
let checkId: string;

beforeAll(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ engineer, checker } = office.people);
}, 60_000);
beforeEach(async () => {
  ({ sheetId, revisionId } = await frozenSheet(office, jobId));
  const sent = await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 2 });
  ({ checkId } = need(sent));
});
afterAll(() => database().destroy());

const codeOf = (result: Result<unknown>) => (result.ok ? 'done' : result.errors[0]?.code);

/** The checker's own sheet with a load of their own, frozen. */
async function derive(load: string): Promise<string> {
  const own = need(await beginOwnSheet(checker, { checkId }));
  const draft = proppedDraft('Own');
  const first = draft.cases[0]?.loads[0];
  if (first) first.first = load;
  expect((await keepDraft(checker, { sheetId: own.sheetId, version: 1, draft })).ok).toBe(true);
  need(await freezeSheet(checker, { sheetId: own.sheetId, reason: 'Own derivation.' }));
  return own.sheetId;
}

describe('the designer’s sheet', () => {
  it('is kept from its checker, whichever way it is asked for', async () => {
    const both = { ...checker, roles: ['engineer' as const, 'checker' as const] };
    const ways = [
      () => openSheet(checker, sheetId),
      () => openRevision(checker, revisionId),
      () => listDraftVersions(checker, { sheetId }),
      () => openDraftVersion(checker, { sheetId, version: 1 }),
      () => copySheet(both, { sheetId }),
      () => exportJob(both, jobId),
    ];
    for (const way of ways) await expect(way()).rejects.toBeInstanceOf(NotAllowed);
    const seen = await openCheck(checker, checkId);
    expect(seen.blocks).toEqual([]);
    expect(seen.inputs).toEqual([]);
    expect(JSON.stringify(seen)).not.toContain('12 kN/m');
  });

  it('stays open to everybody else', async () => {
    expect((await openCheck(engineer, checkId)).blocks.length).toBeGreaterThan(10);
    expect((await openSheet(engineer, sheetId)).version).toBe(1);
  });

  it('cannot be agreed or marked before the comparison, but the basis can be asked about', async () => {
    const agree = { checkId, outcome: 'agreed', note: '', declared: true };
    expect(codeOf(await concludeCheck(checker, agree))).toBe('not-compared');
    const mark = { checkId, kind: 'query', text: 'Which roof?' };
    expect(codeOf(await markLine(checker, { ...mark, line: '2.1' }))).toBe('not-compared');
    expect(codeOf(await markLine(checker, { ...mark, place: 'basis', line: 'roof load' }))).toBe('done');
    expect((await openCheck(engineer, checkId)).marks[0]?.where).toBe('roof load');
  });
});

describe('the checker’s own sheet', () => {
  it('begins with the basis and no input of the designer', async () => {
    const own = need(await beginOwnSheet(checker, { checkId }));
    const { draft, sheet } = await openSheet(checker, own.sheetId);
    expect(sheet.title).toMatch(/^Check of S-\d+: Propped beam$/);
    expect(draft.cases.every((c) => c.loads.length === 0)).toBe(true);
    expect(JSON.stringify(draft)).not.toContain('6 m');
    expect(codeOf(await beginOwnSheet(checker, { checkId }))).toBe('begun-already');
  });

  it('is written by nobody but that checker, who writes in no other', async () => {
    const own = need(await beginOwnSheet(checker, { checkId }));
    const draft = proppedDraft();
    await expect(keepDraft(engineer, { sheetId: own.sheetId, version: 1, draft })).rejects.toBeInstanceOf(
      NotAllowed,
    );
    await expect(keepDraft(checker, { sheetId, version: 1, draft })).rejects.toBeInstanceOf(NotAllowed);
    await expect(freezeSheet(checker, { sheetId, reason: 'Not mine.' })).rejects.toBeInstanceOf(NotAllowed);
  });
});

describe('the comparison', () => {
  it('waits for the own sheet to be frozen', async () => {
    expect(codeOf(await compareOwnSheet(checker, { checkId }))).toBe('not-frozen');
    need(await beginOwnSheet(checker, { checkId }));
    expect(codeOf(await compareOwnSheet(checker, { checkId }))).toBe('not-frozen');
  });

  it('sets every value beside the other with its difference, is frozen, and opens the sheet', async () => {
    // Reactions of a linear structure follow its load: 13.5 kN/m instead of 12 is an eighth more everywhere.
    await derive('13.5 kN/m');
    need(await compareOwnSheet(checker, { checkId }));
    const { own, blocks, check } = await openCheck(checker, checkId);
    const pairs = own?.comparison?.pairs ?? [];
    const moved = pairs.filter((p) => p.change !== undefined);
    expect(moved.length).toBeGreaterThanOrEqual(3);
    for (const p of moved) expect(Math.abs(p.change as number)).toBeCloseTo(0.125, 9);
    expect(pairs.every((p) => p.before !== undefined && p.after !== undefined)).toBe(true);
    expect(check.hidden).toBe(false);
    expect(blocks.length).toBeGreaterThan(10);
    expect((await openRevision(checker, revisionId)).revision.id).toBe(revisionId);
    expect(codeOf(await compareOwnSheet(checker, { checkId }))).toBe('compared-already');
    await expect(
      database()('check_comparisons').where({ check_id: checkId }).update({ at: new Date() }),
    ).rejects.toThrow('frozen');
  });

  it('is followed by the agreement, with the declaration kept', async () => {
    await derive('12 kN/m');
    need(await compareOwnSheet(checker, { checkId }));
    const agree = { checkId, outcome: 'agreed', note: '' };
    expect(codeOf(await concludeCheck(checker, agree))).toBe('not-declared');
    expect(codeOf(await concludeCheck(checker, { ...agree, declared: true }))).toBe('done');
    expect((await openCheck(engineer, checkId)).check.declaration).toMatch(
      /neither involved in nor consulted/,
    );
  });
});
