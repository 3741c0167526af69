// server only
import { createHash, randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { licencesOf } from '@/db/queries/people';
import { insertFile, preparedSealById, setSubmittalState, submittalById } from '@/db/queries/submittals';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { checkCms } from '@/lib/signing/check-cms';
import { insertSignature } from '@/lib/signing/insert-signature';
import { SignatureRefusal } from '@/lib/signing/signature-refusal';
import { type Hole, signedPart } from '@/lib/signing/signed-part';
import { stampSignature } from '@/lib/signing/time-stamp';
import { verifyPdf } from '@/lib/signing/verify-pdf';
import type { Actor } from './actor';
import { sealField } from './create-submittal';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';
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
  const prepared = await preparedSealById(database(), actor.officeId, parsed.data.preparedId);
  if (!prepared || prepared.person_id !== actor.personId) throw new NotFound('prepared seal');
  const now = new Date();
  if (prepared.expires_at < now)
    return mend('', 'More than fifteen minutes went by. Prepare the seal again; nothing was sealed.');
  const licence = (await licencesOf(database(), actor.officeId)).find((l) => l.id === prepared.licence_id);
  if (!licence || licence.expires < now)
    return mend('', 'The licence expired meanwhile. Nothing was sealed.');
  const trusted = trust();
  if (!trusted)
    return mend('', 'No authority is trusted here yet, so nothing can be sealed. Set TRUST_PEM_FILE.');
  const bytes = new Uint8Array(prepared.bytes);
  const place: Hole = hole.parse(prepared.hole);
  try {
    let cms = new Uint8Array(parsed.data.cms);
    const person = { name: actor.name, licenceNumber: licence.number };
    await checkCms(cms, signedPart(bytes, place), person, trusted, now);
    const stampUrl = env().timeStampUrl;
    if (stampUrl) cms = (await stampSignature(cms, { url: stampUrl, anchors: trusted.stampAnchors })).cms;
    const sealed = insertSignature({ bytes, hole: place }, cms);
    const report = await verifyPdf(sealed, {
      trust: trusted,
      expected: { fields: [sealField], stamped: stampUrl !== undefined },
    });
    if (!report.intact) {
      log.error(
        { reasons: report.reasons, submittal: prepared.submittal_id },
        'a sealed file did not verify',
      );
      return mend(
        '',
        `The sealed file did not verify: ${report.reasons[0]?.sentence ?? 'no reason given'} Nothing was stored.`,
      );
    }
    const sha256 = createHash('sha256').update(sealed).digest('hex');
    return await inTransaction(
      { officeId: actor.officeId, person: actor.name },
      async (trx, record): Promise<Result<null>> => {
        const submittal = await submittalById(trx, actor.officeId, prepared.submittal_id, true);
        if (submittal?.state !== 'drafted') {
          await record('could not seal', prepared.submittal_id);
          return mend('', 'This submittal was sealed meanwhile. The first seal stands.');
        }
        const id = randomUUID();
        await insertFile(trx, {
          id,
          office_id: actor.officeId,
          submittal_id: submittal.id,
          kind: 'sealed',
          bytes: Buffer.from(sealed),
          sha256,
          made_at: now,
          signed_by: `${actor.name}, licence ${licence.number}`,
        });
        await setSubmittalState(trx, actor.officeId, submittal.id, 'sealed');
        await record('sealed', `submittal ${submittal.number}`, sha256);
        return done(null);
      },
    );
  } catch (error) {
    if (error instanceof SignatureRefusal) return mend('', error.message);
    throw error;
  }
}
