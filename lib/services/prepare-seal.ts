// server only
import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import type { LicenceRow } from '@/db/queries/people';
import { fileOf, insertPreparedSeal } from '@/db/queries/submittals';
import { drawSeal } from '@/lib/signing/draw-seal';
import { prepareSignature } from '@/lib/signing/prepare-signature';
import type { Hole } from '@/lib/signing/signed-part';
import type { Actor } from './actor';
import { sealField } from './create-submittal';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { sealable } from './sealable';
import { NotFound } from './service-error';

const input = z.object({ submittalId: z.string().max(36) });
const minutes = 15;

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
  return inTransaction(actor, async (trx, record) => {
    const now = new Date();
    const { submittal, job, licence } = await sealable(trx, actor, submittalId, now);
    const file = await fileOf(trx, actor.officeId, submittalId, 'unsigned');
    if (!file) throw new NotFound(`file of submittal ${submittalId}`);
    const prepared = await prepareSignature(new Uint8Array(file.bytes), {
      field: sealField,
      name: actor.name,
      reason: submittal.purpose,
      date: now,
      appearance: drawSealOf(actor, licence, now),
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
    const about = { digest: prepared.baseSha256, jobId: job.id, aboutId: submittalId };
    await record('prepared the seal', `${job.number} submittal ${submittal.number}`, about);
    return { preparedId: id, hole: prepared.hole, size: prepared.bytes.length };
  });
}

const font = (weight: number) =>
  new Uint8Array(readFileSync(join(process.cwd(), 'fonts', `inter-${weight}.ttf`)));

const dayWords = (d: Date, timeZone: string) =>
  d.toLocaleDateString('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone });

function drawSealOf(actor: Actor, licence: LicenceRow, now: Date) {
  return drawSeal(
    {
      title: licence.profession,
      jurisdiction: licence.jurisdiction,
      name: actor.name,
      licenceNumber: licence.number,
      licenceExpires: dayWords(licence.expires, 'UTC'),
      date: dayWords(now, actor.zone),
    },
    { regular: font(400), medium: font(500), semibold: font(600) },
  );
}
