// server only
import { createHash, randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { licencesOf } from '@/db/queries/people';
import { dropPreparedSeals, insertFile, preparedSealById, setSubmittalState } from '@/db/queries/submittals';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import type { Person } from '@/lib/signing/check-cms';
import { completeSignature, NotIntact } from '@/lib/signing/complete-signature';
import { SignatureRefusal } from '@/lib/signing/signature-refusal';
import type { Hole } from '@/lib/signing/signed-part';
import type { Actor } from './actor';
import { sealField } from './create-submittal';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { mend, type Result, unread } from './result';
import { sealable } from './sealable';
import { NotFound, Refused, refuse } from './service-error';
import { trust } from './trust';

const input = z.object({
  preparedId: z.string().max(36),
  cms: z.instanceof(Uint8Array).refine((b) => b.length > 0 && b.length < 12_000),
});
const hole = z.object({ from: z.number().int(), to: z.number().int() });

/**
 * Takes the signature from the browser, checks it at the server's clock against the person and the licence, has it
 * stamped, verifies the whole file and stores it once. Anything amiss leaves the submittal as it was.
 */
export async function completeSeal(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'engineer-of-record');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { officeId } = actor;
  const prepared = await preparedSealById(database(), officeId, parsed.data.preparedId);
  if (!prepared || prepared.person_id !== actor.personId) throw new NotFound('prepared seal');
  const now = new Date();
  if (prepared.expires_at < now)
    return mend(
      'prepared-over',
      '',
      'More than fifteen minutes went by. Prepare the seal again; nothing was sealed.',
    );
  const licence = (await licencesOf(database(), officeId)).find((l) => l.id === prepared.licence_id);
  if (!licence)
    return mend('licence-withdrawn', '', 'The licence was withdrawn meanwhile. Nothing was sealed.');
  const person = { name: actor.name, licenceNumber: licence.number };
  try {
    const file = { bytes: new Uint8Array(prepared.bytes), hole: hole.parse(prepared.hole) };
    const sealed = await finish(file, new Uint8Array(parsed.data.cms), person);
    const sha256 = createHash('sha256').update(sealed).digest('hex');
    return await inTransaction(actor, async (trx, record) => {
      const { submittal, job } = await sealable(trx, actor, prepared.submittal_id, new Date());
      await insertFile(trx, {
        id: randomUUID(),
        office_id: officeId,
        submittal_id: submittal.id,
        kind: 'sealed',
        bytes: Buffer.from(sealed),
        sha256,
        made_at: now,
        signed_by: `${actor.name}, licence ${licence.number}`,
      });
      await setSubmittalState(trx, officeId, submittal.id, 'sealed');
      await dropPreparedSeals(trx, officeId, submittal.id);
      const about = { digest: sha256, jobId: job.id, aboutId: submittal.id };
      await record('sealed', `${job.number} submittal ${submittal.number}`, about);
      return null;
    });
  } catch (error) {
    if (error instanceof SignatureRefusal) {
      log.warn({ err: error, submittal: prepared.submittal_id }, 'a signature was not accepted');
      return mend(error.code, '', error.message);
    }
    if (error instanceof Refused) return mend(error.code, error.path, error.message);
    throw error;
  }
}

/** The finished file; without a trusted authority, or when it does not verify, nothing is stored. */
async function finish(
  file: { bytes: Uint8Array<ArrayBuffer>; hole: Hole },
  signature: Uint8Array<ArrayBuffer>,
  person: Person,
): Promise<Uint8Array> {
  const trusted = trust();
  if (!trusted)
    refuse('no-trust', '', 'No authority is trusted here yet, so nothing can be sealed. Set TRUST_PEM_FILE.');
  try {
    const { pdf } = await completeSignature(file, signature, person, {
      trust: trusted,
      timeStampUrl: env().timeStampUrl,
      fields: [sealField],
    });
    return pdf;
  } catch (error) {
    if (!(error instanceof NotIntact)) throw error;
    const { reasons } = error.report;
    log.error({ reasons }, 'a sealed file did not verify');
    const why = reasons[0]?.sentence ?? 'the signature does not cover the whole file.';
    refuse('not-intact', '', `The sealed file did not verify: ${why} Nothing was stored.`);
  }
}
