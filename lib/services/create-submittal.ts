// server only
import { createHash, randomUUID } from 'node:crypto';
import { z } from 'zod';
import { jobById, takeNumber, touchJob } from '@/db/queries/jobs';
import { peopleOf } from '@/db/queries/people';
import { type RevisionLine, revisionById } from '@/db/queries/revisions';
import { insertFile, insertSubmittal } from '@/db/queries/submittals';
import { placeSignatureFields } from '@/lib/signing/place-signature-fields';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { printPackage } from './print-package';
import { makers, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  jobId: z.string().max(36),
  purpose: z.string().trim().min(3, 'Say what the submittal is for, such as: for permit.').max(200),
  remarks: z.string().trim().max(2000),
  revisionIds: z.array(z.string().max(36)).min(1, 'Choose at least one sheet.').max(200),
});

/** The field of the engineer of record; all fields are placed before the first signature. */
export const sealField = 'engineer-of-record';

/** Gathers checked revisions into a numbered submittal and prints its package, unsigned. */
export async function createSubmittal(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, purpose, remarks, revisionIds } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<{ id: string }>> => {
      const job = await jobById(trx, actor.officeId, jobId);
      if (!job) throw new NotFound(`job ${jobId}`);
      const revisions: RevisionLine[] = [];
      for (const id of revisionIds) {
        const r = await revisionById(trx, actor.officeId, id);
        if (!r || r.job_id !== jobId) throw new NotFound(`revision ${id}`);
        if (r.check_state !== 'agreed') {
          await record('could not gather a submittal', sheetName(r.sheet_number));
          return mend(
            'revisionIds',
            `${sheetName(r.sheet_number)} is not checked. Only checked sheets go out.`,
          );
        }
        revisions.push(r);
      }
      const number = await takeNumber(trx, actor.officeId, jobId, 'next_submittal');
      if (number === undefined) throw new NotFound(`job ${jobId}`);
      const people = await peopleOf(trx, actor.officeId);
      const named = (initials: (string | null)[]) =>
        people
          .filter((p) => initials.includes(p.initials))
          .map((p) => ({ name: p.name, initials: p.initials }));
      const engineer = people.find((p) => p.roles.includes('engineer-of-record'));
      if (!engineer) {
        await record('could not gather a submittal', `job ${job.number}`);
        return mend('', 'The office has no engineer of record who could seal it.');
      }
      const at = new Date();
      const printed = await printPackage(
        {
          office: actor.officeName,
          job,
          purpose,
          submittal: number,
          date: at,
          engineer: { name: engineer.name, initials: engineer.initials },
          originators: named(revisions.map((r) => r.originator)),
          checkers: named(revisions.map((r) => r.checker)),
        },
        revisions,
      );
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
      const id = randomUUID();
      const sha256 = createHash('sha256').update(bytes).digest('hex');
      await insertSubmittal(
        trx,
        {
          id,
          office_id: actor.officeId,
          job_id: jobId,
          number,
          purpose,
          remarks,
          state: 'drafted',
          pages: printed.pages.length,
          created_by: actor.personId,
          created_at: at,
        },
        revisionIds,
      );
      await insertFile(trx, {
        id: randomUUID(),
        office_id: actor.officeId,
        submittal_id: id,
        kind: 'unsigned',
        bytes: Buffer.from(bytes),
        sha256,
        made_at: at,
        signed_by: null,
      });
      await touchJob(trx, actor.officeId, jobId);
      await record('gathered submittal', `${job.number} submittal ${number}`, sha256);
      return done({ id });
    },
  );
}
