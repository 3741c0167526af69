import { randomUUID } from 'node:crypto';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { insertLicence } from '@/db/queries/people';
import type { Actor } from '@/lib/services/actor';
import { addLicence } from '@/lib/services/add-licence';
import { completeSeal } from '@/lib/services/complete-seal';
import { createSubmittal } from '@/lib/services/create-submittal';
import { licenceInForce } from '@/lib/services/licence-in-force';
import { nameJobPeople } from '@/lib/services/name-job-people';
import { openSubmittal } from '@/lib/services/open-submittal';
import { prepareSeal } from '@/lib/services/prepare-seal';
import { readPreparedFile, readSubmittalFile } from '@/lib/services/read-file';
import { NotAllowed, NotFound } from '@/lib/services/service-error';
import { trust } from '@/lib/services/trust';
import { withdrawLicence } from '@/lib/services/withdraw-licence';
import { verifyPdf } from '@/lib/signing/verify-pdf';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet } from './sheet-factory';
import { draftedSubmittal, sealSubmittal, signPrepared } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
let revisionId: string;
let sealer: Actor;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ revisionId } = await checkedSheet(office, jobId));
  sealer = office.people.engineerOfRecord;
});

const gather = () => ({ jobId, purpose: 'for permit', remarks: '', revisionIds: [revisionId] });
const code = (answer: { ok: boolean }) =>
  (answer as { ok: false; errors: { code: string }[] }).errors.map((e) => e.code);

/** The office's licences, in force to the day given. */
async function licencesTo(expires: string): Promise<void> {
  await database()('licences')
    .where({ office_id: office.id })
    .update({ expires: new Date(expires) });
}

async function stateOf(submittalId: string): Promise<string> {
  return (await openSubmittal(sealer, submittalId)).submittal.state;
}

describe('a seal', () => {
  it('makes a file that verifies, names the licence, and is stored once', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, submittalId);
    const file = new Uint8Array(await readSubmittalFile(sealer, submittalId));
    const trusted = trust();
    if (!trusted) throw new Error('the tests have an authority');
    const report = await verifyPdf(file, { trust: trusted });
    expect(report.intact).toBe(true);
    expect((await openSubmittal(sealer, submittalId)).file.signedBy).toBe(
      'Tomas Lindqvist, licence SE 20417',
    );
    expect(await database()('prepared_seals').where({ submittal_id: submittalId })).toEqual([]);
  });

  it('is refused with an expired licence, and the submittal stays as it was', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await licencesTo('2020-06-30');
    const refused = await prepareSeal(sealer, { submittalId });
    expect(code(refused)).toEqual(['licence-expired']);
    expect(await stateOf(submittalId)).toBe('drafted');
  });

  it('is refused when the licence expires between preparing and sealing', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const prepared = need(await prepareSeal(sealer, { submittalId }));
    const cms = await signPrepared(sealer, prepared);
    await licencesTo('2020-06-30');
    expect(code(await completeSeal(sealer, { preparedId: prepared.preparedId, cms }))).toEqual([
      'licence-expired',
    ]);
    expect(await stateOf(submittalId)).toBe('drafted');
  });

  it('is refused when the licence is withdrawn between preparing and sealing', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const prepared = need(await prepareSeal(sealer, { submittalId }));
    const cms = await signPrepared(sealer, prepared);
    const licence = await database()('licences').where({ office_id: office.id }).first();
    need(await withdrawLicence(office.people.administrator, { licenceId: licence.id }));
    expect(code(await completeSeal(sealer, { preparedId: prepared.preparedId, cms }))).toEqual([
      'licence-withdrawn',
    ]);
  });

  it('is refused after fifteen minutes, and the prepared bytes are no longer given out', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const prepared = need(await prepareSeal(sealer, { submittalId }));
    const cms = await signPrepared(sealer, prepared);
    await database()('prepared_seals').update({ expires_at: new Date(Date.now() - 1000) });
    const input = { preparedId: prepared.preparedId, cms };
    expect(code(await completeSeal(sealer, input))).toEqual(['prepared-over']);
    await expect(readPreparedFile(sealer, prepared.preparedId)).rejects.toBeInstanceOf(NotFound);
  });

  it('is refused over other bytes than those prepared', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const first = need(await prepareSeal(sealer, { submittalId }));
    const cms = await signPrepared(sealer, first);
    const other = await draftedSubmittal(office, jobId, [revisionId]);
    const second = need(await prepareSeal(sealer, { submittalId: other }));
    const refused = await completeSeal(sealer, { preparedId: second.preparedId, cms });
    expect(code(refused)).toEqual(['content-changed']);
    expect(await stateOf(other)).toBe('drafted');
  });

  it('is refused with the key of another person', async () => {
    await database()('people').where({ id: sealer.personId }).update({ name: 'Someone Else' });
    const someone = { ...sealer, name: 'Someone Else' };
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const prepared = need(await prepareSeal(someone, { submittalId }));
    const cms = await signPrepared(someone, prepared);
    const refused = await completeSeal(someone, { preparedId: prepared.preparedId, cms });
    expect(code(refused)).toEqual(['another-person']);
  });

  it('is refused when what arrives is no signature', async () => {
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const { preparedId } = need(await prepareSeal(sealer, { submittalId }));
    const refused = await completeSeal(sealer, { preparedId, cms: new Uint8Array([1, 2, 3]) });
    expect(code(refused)).toEqual(['not-a-signature']);
  });
});

describe('who seals', () => {
  const second = async (): Promise<Actor> => {
    const personId = randomUUID();
    await database()('people').insert({
      id: personId,
      office_id: office.id,
      email: `${personId}@office.example`,
      name: 'Second Sealer',
      initials: 'SS',
      roles: JSON.stringify(['engineer-of-record']),
    });
    await insertLicence(database(), {
      id: randomUUID(),
      office_id: office.id,
      person_id: personId,
      jurisdiction: 'Orrin',
      profession: 'Structural Engineer',
      number: 'SE 2',
      expires: new Date('2030-01-01'),
    });
    return { ...sealer, personId, name: 'Second Sealer', initials: 'SS', roles: ['engineer-of-record'] };
  };

  it('is asked for when two could', async () => {
    await second();
    expect(code(await createSubmittal(office.people.engineer, gather()))).toEqual([
      'several-engineers-of-record',
    ]);
  });

  it('is whom the job names, and nobody else', async () => {
    const other = await second();
    need(
      await nameJobPeople(office.people.engineer, {
        jobId,
        part: 'engineer-of-record',
        personIds: [other.personId],
      }),
    );
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    await expect(prepareSeal(sealer, { submittalId })).rejects.toBeInstanceOf(NotAllowed);
    expect((await prepareSeal(other, { submittalId })).ok).toBe(true);
  });

  it('is nobody where no licence is in force for the jurisdiction', async () => {
    await licencesTo('2020-06-30');
    expect(code(await createSubmittal(office.people.engineer, gather()))).toEqual(['no-engineer-of-record']);
  });

  it('cannot be someone without the role', async () => {
    const { administrator, checker } = office.people;
    const refused = await addLicence(administrator, {
      personId: checker.personId,
      jurisdiction: 'Orrin',
      profession: 'Structural Engineer',
      number: '7',
      expires: '2030-01-01',
    });
    expect(code(refused)).toEqual(['not-engineer-of-record']);
  });
});

describe('a licence', () => {
  const licence = { expires: new Date('2026-06-30') };

  it('is in force to the end of its last day, by the calendar of the office', () => {
    expect(licenceInForce(licence, new Date('2026-07-01T03:00:00Z'), 'America/Chicago')).toBe(true);
    expect(licenceInForce(licence, new Date('2026-07-01T05:00:00Z'), 'America/Chicago')).toBe(false);
    expect(licenceInForce(licence, new Date('2026-06-30T14:00:00Z'), 'Asia/Tokyo')).toBe(true);
    expect(licenceInForce(licence, new Date('2026-06-30T15:00:00Z'), 'Asia/Tokyo')).toBe(false);
  });
});
