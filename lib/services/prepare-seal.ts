// server only
import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { jobById } from '@/db/queries/jobs';
import { licencesOf } from '@/db/queries/people';
import { fileOf, insertPreparedSeal, submittalById } from '@/db/queries/submittals';
import { drawSeal } from '@/lib/signing/draw-seal';
import { prepareSignature } from '@/lib/signing/prepare-signature';
import type { Hole } from '@/lib/signing/signed-part';
import type { Actor } from './actor';
import { sealField } from './create-submittal';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ submittalId: z.string().max(36) });
const minutes = 15;

const dayWords = (d: Date) =>
  d.toLocaleDateString('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' });

/**
 * Prepares the file that the browser will sign: the visible seal is drawn, the hole for the signature is kept. Refused
 * without a licence in force for the job's jurisdiction.
 */
export async function prepareSeal(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ preparedId: string; hole: Hole; size: number }>> {
  requireRole(actor, 'engineer-of-record');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { submittalId } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<{ preparedId: string; hole: Hole; size: number }>> => {
      const submittal = await submittalById(trx, actor.officeId, submittalId, true);
      const job = submittal && (await jobById(trx, actor.officeId, submittal.job_id));
      const file = await fileOf(trx, actor.officeId, submittalId, 'unsigned');
      if (!submittal || !job || !file) throw new NotFound(`submittal ${submittalId}`);
      const name = `${job.number} submittal ${submittal.number}`;
      const refuse = async (message: string) => {
        await record('could not prepare the seal', name);
        return mend('', message);
      };
      if (submittal.state !== 'drafted')
        return refuse('This submittal is sealed already. A sealed file is never written again.');
      const now = new Date();
      const licence = (await licencesOf(trx, actor.officeId)).find(
        (l) => l.person_id === actor.personId && l.jurisdiction === job.jurisdiction,
      );
      if (!licence)
        return refuse(`You have no licence for ${job.jurisdiction} in the register of the office.`);
      if (licence.expires < now)
        return refuse(
          `Your licence ${licence.number} for ${job.jurisdiction} expired on ${dayWords(licence.expires)}. Nothing is sealed.`,
        );
      const font = (weight: number) =>
        new Uint8Array(readFileSync(join(process.cwd(), 'fonts', `inter-${weight}.ttf`)));
      const appearance = drawSeal(
        {
          title: licence.profession,
          jurisdiction: licence.jurisdiction,
          name: actor.name,
          licenceNumber: licence.number,
          licenceExpires: dayWords(licence.expires),
          date: dayWords(now),
        },
        { regular: font(400), medium: font(500), semibold: font(600) },
      );
      const prepared = await prepareSignature(new Uint8Array(file.bytes), {
        field: sealField,
        name: actor.name,
        reason: submittal.purpose,
        date: now,
        appearance,
      });
      const id = randomUUID();
      await insertPreparedSeal(trx, {
        id,
        office_id: actor.officeId,
        submittal_id: submittalId,
        person_id: actor.personId,
        licence_id: licence.id,
        bytes: Buffer.from(prepared.bytes),
        hole: prepared.hole,
        expires_at: new Date(now.getTime() + minutes * 60_000),
      });
      await record('prepared the seal', name, prepared.baseSha256);
      return done({ preparedId: id, hole: prepared.hole, size: prepared.bytes.length });
    },
  );
}
