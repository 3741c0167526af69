// server only
import { createHash, randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { z } from 'zod';
import { uncheckedOf } from '@/db/queries/checks';
import { takeNumber, touchJob } from '@/db/queries/jobs';
import { type PersonRow, peopleOf } from '@/db/queries/people';
import { type RevisionLine, revisionById } from '@/db/queries/revisions';
import { insertFile, insertSubmittal } from '@/db/queries/submittals';
import { placeSignatureFields } from '@/lib/signing/place-signature-fields';
import type { Actor } from './actor';
import { certifiedCheck } from './certified-check';
import { changesSince } from './changes-since';
import { engineerOfRecord } from './engineer-of-record';
import { inTransaction } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { packageHistory } from './package-history';
import { type PackageRequest, printPackage } from './print-package';
import { registerOfJob } from './register-of-job';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  jobId: z.string().max(36),
  purpose: z.string().trim().min(3, 'Say what the submittal is for, such as: for permit.').max(200),
  remarks: z.string().trim().max(2000),
  revisionIds: z
    .array(z.string().max(36))
    .min(1, 'Choose at least one sheet.')
    .max(200)
    .transform((ids) => [...new Set(ids)]),
});

/** The field of the engineer of record; all fields are placed before the first signature. */
export const sealField = 'engineer-of-record';

/** A file is sent to the database at twice its size, in one packet of at most 128 MB; the signature still joins it. */
const mostBytes = 48 * 1024 * 1024;

/** Gathers checked revisions into a numbered submittal and prints its package, unsigned. */
export async function createSubmittal(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, purpose, remarks, revisionIds } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const job = await jobOpenToWork(trx, officeId, jobId);
    const revisions = await checkedRevisions(trx, officeId, jobId, revisionIds);
    const people = await peopleOf(trx, officeId);
    const at = new Date();
    const engineer = await engineerOfRecord(trx, actor, job, people, at);
    const number = await takeNumber(trx, officeId, jobId, 'next_submittal');
    if (number === undefined) throw new NotFound(`job ${jobId}`);
    const changes = await changesSince(trx, { office_id: officeId, job_id: jobId, number }, revisions);
    const printed = await printWithField(
      {
        office: actor.officeName,
        zone: actor.zone,
        job,
        purpose,
        submittal: number,
        date: at,
        engineer,
        originators: named(
          people,
          revisions.map((r) => r.originator),
        ),
        checkers: named(
          people,
          revisions.map((r) => r.checker),
        ),
        checks: await checksOf(trx, actor, revisions),
        previous: changes.since,
        history: await packageHistory(trx, officeId, changes, revisions),
        comments: await registerOfJob(trx, actor, jobId),
      },
      revisions,
    );
    const id = randomUUID();
    const submittal = {
      id,
      office_id: officeId,
      job_id: jobId,
      number,
      purpose,
      remarks,
      state: 'drafted' as const,
      pages: printed.pages,
      created_by: actor.personId,
      created_at: at,
      engineer_id: engineer.id,
      void_reason: null,
    };
    await insertSubmittal(trx, submittal, revisionIds);
    const sha256 = createHash('sha256').update(printed.bytes).digest('hex');
    await insertFile(trx, {
      id: randomUUID(),
      office_id: officeId,
      submittal_id: id,
      kind: 'unsigned',
      bytes: Buffer.from(printed.bytes),
      sha256,
      made_at: at,
      signed_by: null,
    });
    await touchJob(trx, officeId, jobId);
    const name = `${job.number} submittal ${number}`;
    await record('gathered submittal', name, { digest: sha256, jobId, aboutId: id });
    return { id };
  });
}

/** The revisions in the order asked for, each held at "agreed" until the transaction ends. */
async function checkedRevisions(
  trx: Knex.Transaction,
  officeId: string,
  jobId: string,
  ids: readonly string[],
): Promise<RevisionLine[]> {
  const revisions: RevisionLine[] = [];
  for (const id of ids) {
    const r = await revisionById(trx, officeId, id);
    if (r?.job_id !== jobId) throw new NotFound(`revision ${id}`);
    revisions.push(r);
  }
  const unchecked = await uncheckedOf(trx, officeId, ids);
  const names = revisions.filter((r) => unchecked.includes(r.id)).map((r) => sheetName(r.sheet_number));
  if (names.length > 0) {
    const are = names.length === 1 ? 'is' : 'are';
    const said = `${names.join(', ')} ${are} not checked. Only checked sheets go out.`;
    refuse('not-checked', 'revisionIds', said);
  }
  return revisions;
}

function named(people: PersonRow[], initials: (string | null)[]): { name: string; initials: string }[] {
  return people
    .filter((p) => initials.includes(p.initials))
    .map((p) => ({ name: p.name, initials: p.initials }));
}

/** Prints the package with the field that the engineer of record will sign. */
async function printWithField(
  request: PackageRequest,
  revisions: readonly RevisionLine[],
): Promise<{ bytes: Uint8Array; pages: number }> {
  const printed = await printPackage(request, revisions);
  const [place] = printed.sealPlaces;
  if (!place) throw new Error('the package has no place for a seal');
  const bytes = await placeSignatureFields(printed.bytes, [
    {
      field: sealField,
      page: place.page,
      box: [place.x, place.y, place.size, place.size],
      label: 'Seal of the engineer of record',
    },
  ]);
  if (bytes.length > mostBytes) {
    const size = Math.ceil(bytes.length / 1024 / 1024);
    refuse('too-large', '', `The package has ${size} MB; at most 48 can be kept. Send it in two submittals.`);
  }
  return { bytes, pages: printed.pages.length };
}

async function checksOf(trx: Knex.Transaction, actor: Actor, revisions: readonly RevisionLine[]) {
  return Promise.all(
    revisions.flatMap((r) => (r.check_id === null ? [] : [certifiedCheck(trx, actor, r.check_id)])),
  );
}
