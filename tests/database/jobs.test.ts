import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { copySheet } from '@/lib/services/copy-sheet';
import { createJob } from '@/lib/services/create-job';
import { createSheet } from '@/lib/services/create-sheet';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { keepDraft } from '@/lib/services/keep-draft';
import { listDraftVersions } from '@/lib/services/list-draft-versions';
import { listJobs } from '@/lib/services/list-jobs';
import { nameJobPeople } from '@/lib/services/name-job-people';
import { openDraftVersion } from '@/lib/services/open-draft-version';
import { openJob } from '@/lib/services/open-job';
import { openSheet } from '@/lib/services/open-sheet';
import { readAudit } from '@/lib/services/read-audit';
import { NotFound } from '@/lib/services/service-error';
import { setJobState } from '@/lib/services/set-job-state';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { makeSheet, proppedDraft } from './sheet-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
});

const fields = {
  title: 'T',
  place: '',
  units: 'US',
  pageSize: 'Letter',
  jurisdiction: 'Orrin',
  codes: '',
};

describe('a job', () => {
  it('has a number of its own in the office', async () => {
    const twice = await createJob(office.people.engineer, { ...fields, number: '26-001' });
    expect(twice).toMatchObject({ ok: false, errors: [{ code: 'number-taken', path: 'number' }] });
    const elsewhere = (await makeOffice()).people.engineer;
    expect((await createJob(elsewhere, { ...fields, number: '26-001' })).ok).toBe(true);
  });

  it('is refused an authority of another office', async () => {
    const { authorityId } = await makeOffice();
    const strange = await createJob(office.people.engineer, { ...fields, number: 'X', authorityId });
    expect(strange).toMatchObject({ ok: false, errors: [{ code: 'unknown-authority' }] });
  });

  it('that is closed can be read, and nothing new is made in it until it is opened again', async () => {
    const { engineer } = office.people;
    const sheetId = await makeSheet(office, jobId);
    need(await setJobState(engineer, { jobId, state: 'closed' }));
    const refused = [
      await createSheet(engineer, { jobId, start: 'beam', title: 'T' }),
      await copySheet(engineer, { sheetId }),
      await freezeSheet(engineer, { sheetId, reason: 'Late.' }),
    ];
    for (const r of refused) expect(r).toMatchObject({ ok: false, errors: [{ code: 'job-closed' }] });
    expect((await openJob(engineer, jobId)).sheets).toHaveLength(1);
    expect((await listJobs(engineer, {})).total).toBe(0);
    expect((await listJobs(engineer, { state: 'closed' })).total).toBe(1);
    need(await setJobState(engineer, { jobId, state: 'open' }));
    expect((await createSheet(engineer, { jobId, start: 'beam', title: 'T' })).ok).toBe(true);
  });

  it('names people who have the role in the office, and no others', async () => {
    const { engineer, checker } = office.people;
    need(await nameJobPeople(engineer, { jobId, part: 'checker', personIds: [checker.personId] }));
    expect((await openJob(engineer, jobId)).people).toMatchObject([{ part: 'checker', name: checker.name }]);
    const wrong = await nameJobPeople(engineer, { jobId, part: 'checker', personIds: [engineer.personId] });
    expect(wrong).toMatchObject({ ok: false, errors: [{ code: 'lacks-role' }] });
    const stranger = (await makeOffice()).people.checker;
    await expect(
      nameJobPeople(engineer, { jobId, part: 'checker', personIds: [stranger.personId] }),
    ).rejects.toBeInstanceOf(NotFound);
  });
});

describe('the list of jobs', () => {
  it('is searched by number, title, place and authority, taking % and _ as they are', async () => {
    const { engineer } = office.people;
    need(await createJob(engineer, { ...fields, number: '26-100', title: 'Quay 100%', place: 'Weir Lane' }));
    need(await createJob(engineer, { ...fields, number: '26-101', title: 'Mill' }));
    const found = async (search: string) => (await listJobs(engineer, { search })).rows.map((r) => r.number);
    expect(await found('quay')).toEqual(['26-100']);
    expect(await found('weir')).toEqual(['26-100']);
    expect(await found('Invented Auth')).toEqual(['26-001']);
    expect(await found('0%')).toEqual(['26-100']);
    expect(await found('_')).toEqual([]);
  });

  it('is sorted and paged by twenty', async () => {
    const { engineer } = office.people;
    for (let n = 1; n <= 22; n++)
      need(await createJob(engineer, { ...fields, number: `27-${String(n).padStart(3, '0')}` }));
    const first = await listJobs(engineer, { sort: 'number' });
    const second = await listJobs(engineer, { sort: 'number', page: '2' });
    expect([first.rows.length, first.total, first.pages]).toEqual([20, 23, 2]);
    expect(first.rows[0]?.number).toBe('27-022');
    expect(second.rows.map((r) => r.number)).toEqual(['27-002', '27-001', '26-001']);
  });

  it('survives odd questions', async () => {
    const odd = await listJobs(office.people.engineer, { sort: 'x; DROP', page: '-4', state: 'none' });
    expect(odd.page).toBe(1);
  });
});

describe('the history of a draft', () => {
  it('holds every version with its person, and an earlier one can be kept again on top', async () => {
    const { engineer, engineerOfRecord } = office.people;
    const sheetId = await makeSheet(office, jobId);
    await keepDraft(engineer, { sheetId, version: 1, draft: proppedDraft('Second') });
    await keepDraft(engineerOfRecord, { sheetId, version: 2, draft: proppedDraft('Third') });
    const history = await listDraftVersions(engineer, { sheetId });
    expect(history.map((h) => [h.version, h.by])).toEqual([
      [3, engineerOfRecord.name],
      [2, engineer.name],
      [1, engineer.name],
    ]);
    const { draft } = await openDraftVersion(engineer, { sheetId, version: 2 });
    await keepDraft(engineer, { sheetId, version: 3, draft });
    const now = await openSheet(engineer, sheetId);
    expect([now.version, now.draft.title, now.sheet.title]).toEqual([4, 'Second', 'Second']);
  });
});

describe('names as long as they may be', () => {
  it('fit in the record', async () => {
    const { engineer } = office.people;
    const title = 'T'.repeat(120);
    const { id } = need(await createSheet(engineer, { jobId, start: 'portal', title }));
    need(await copySheet(engineer, { sheetId: id }));
    const record = (await readAudit(engineer, { jobId })).entries;
    expect(record.map((r) => r.verb)).toEqual(['copied sheet', 'made sheet', 'opened job']);
    expect((await readAudit(engineer, { aboutId: id })).entries[0]?.subject).toBe(`S-01 ${title}`);
  });
});
