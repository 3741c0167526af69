import { execFileSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { compareRevisions } from '@/lib/services/compare-revisions';
import { concludeCheck } from '@/lib/services/conclude-check';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { keepDraft } from '@/lib/services/keep-draft';
import { listDraftVersions } from '@/lib/services/list-draft-versions';
import { openRevision } from '@/lib/services/open-revision';
import { openSheet } from '@/lib/services/open-sheet';
import { readSubmittalFile } from '@/lib/services/read-file';
import { restoreRevision } from '@/lib/services/restore-revision';
import { sendToCheck } from '@/lib/services/send-to-check';
import { NotFound } from '@/lib/services/service-error';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet, proppedDraft } from './sheet-factory';
import { draftedSubmittal, sealSubmittal, sendTo } from './submittal-factory';

let office: Office;
let jobId: string;
let sheetId: string;
let first: string;
let second: string;

/** A sheet that went out in revision 0, and whose revision 1 carries 15 instead of 12 kN/m. */
beforeAll(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ sheetId, revisionId: first } = await checkedSheet(office, jobId));
  const submittal = await draftedSubmittal(office, jobId, [first]);
  await sealSubmittal(office, submittal);
  await sendTo(office, submittal);
  const { engineer, checker } = office.people;
  const heavier = proppedDraft();
  const load = heavier.cases[0]?.loads[0];
  if (load) load.first = '15 kN/m';
  await keepDraft(engineer, { sheetId, version: 1, draft: heavier });
  ({ revisionId: second } = need(await freezeSheet(engineer, { sheetId, reason: 'Heavier cladding.' })));
  const sent = await sendToCheck(engineer, { revisionId: second, checkerId: checker.personId, category: 1 });
  need(await concludeCheck(checker, { checkId: need(sent).checkId, outcome: 'agreed', note: '' }));
}, 60_000);
afterAll(() => database().destroy());

describe('two revisions side by side', () => {
  it('name the one input that changed', async () => {
    const { inputs } = await compareRevisions(office.people.checker, { revisionId: second });
    expect(inputs).toEqual([
      { place: expect.stringMatching(/^case \w+, load 1, value$/), before: '12 kN/m', after: '15 kN/m' },
    ]);
  });

  it('show each reaction a quarter greater, as the load is', async () => {
    const { values } = await compareRevisions(office.people.checker, { revisionId: second });
    const reactions = values.filter((v) => v.name.includes('along y'));
    expect(reactions).toHaveLength(2);
    for (const r of reactions) expect(r.change).toBeCloseTo(0.25, 9);
  });

  it('leave the lines of the basis as they were', async () => {
    const { lines } = await compareRevisions(office.people.checker, { revisionId: second });
    expect(lines.some((l) => !l.same)).toBe(true);
    expect(lines.filter((l) => l.after?.id.startsWith('1.')).every((l) => l.same)).toBe(true);
  });

  it('are not there for a first revision', async () => {
    await expect(compareRevisions(office.people.checker, { revisionId: first })).rejects.toBeInstanceOf(
      NotFound,
    );
  });
});

describe('a re-issued package', () => {
  it('marks what changed, flags the sheet and carries the history', async () => {
    const submittal = await draftedSubmittal(office, jobId, [second]);
    const path = join(mkdtempSync(join(tmpdir(), 'fairhand-history-')), 'package.pdf');
    writeFileSync(path, await readSubmittalFile(office.people.engineer, submittal));
    const text = execFileSync('pdftotext', ['-layout', path, '-'], { encoding: 'utf8' });
    expect(text).toContain('changed in rev 1');
    expect(text).toMatch(/changed since\s/);
    expect(text).toContain('Revisions of the sheets');
    expect(text).toContain('Heavier cladding.');
    expect(text).toContain('For checking.');
  });

  it('shows the same lines marked on the screen', async () => {
    const { changedIn, blocks } = await openRevision(office.people.checker, second);
    expect(changedIn.length).toBeGreaterThan(5);
    expect(new Set(changedIn.map(([, revision]) => revision))).toEqual(new Set([1]));
    const ids = new Set(blocks.map((b) => b.id));
    for (const [line] of changedIn) expect(ids.has(line)).toBe(true);
    expect((await openRevision(office.people.checker, first)).changedIn).toEqual([]);
  });
});

describe('going back to an old revision', () => {
  it('makes a new draft of it and overwrites nothing', async () => {
    const { engineer } = office.people;
    need(await restoreRevision(engineer, { revisionId: first }));
    const open = await openSheet(engineer, sheetId);
    expect(open.draft.cases[0]?.loads[0]?.first).toBe('12 kN/m');
    const versions = await listDraftVersions(engineer, { sheetId });
    expect(versions.map((v) => v.version)).toEqual([3, 2, 1]);
    expect((await openRevision(engineer, second)).revision.number).toBe(1);
  });
});
