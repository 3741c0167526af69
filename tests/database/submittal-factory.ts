import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { database } from '@/db/connection';
import type { ReviewLinkRow } from '@/db/queries/reviews';
import type { Actor } from '@/lib/services/actor';
import { completeSeal } from '@/lib/services/complete-seal';
import { createSubmittal } from '@/lib/services/create-submittal';
import { reviewDoor } from '@/lib/services/open-review';
import { prepareSeal } from '@/lib/services/prepare-seal';
import { readPreparedFile } from '@/lib/services/read-file';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { buildCms } from '@/lib/signing/build-cms';
import { demoKeyPassword } from '@/lib/signing/demo-keys';
import { openKeyFile } from '@/lib/signing/open-key-file';
import { signedPart } from '@/lib/signing/signed-part';
import { need, type Office } from './office-factory';

export async function draftedSubmittal(
  office: Office,
  jobId: string,
  revisionIds: string[],
): Promise<string> {
  const input = { jobId, purpose: 'for permit', remarks: '', revisionIds };
  return need(await createSubmittal(office.people.engineer, input)).id;
}

/** What the browser does: fetches the prepared file and signs it with the key of the engineer of record. */
export async function signPrepared(
  actor: Actor,
  prepared: { preparedId: string; hole: { from: number; to: number } },
): Promise<Uint8Array> {
  const file = readFileSync(join(process.env.DEMO_FOLDER as string, 'tomas-lindqvist.p12'));
  const signer = await openKeyFile(new Uint8Array(file), demoKeyPassword);
  const bytes = new Uint8Array(await readPreparedFile(actor, prepared.preparedId));
  const digest = await crypto.subtle.digest(signer.hash, signedPart(bytes, prepared.hole));
  return buildCms(new Uint8Array(digest), signer);
}

export async function sealSubmittal(office: Office, submittalId: string): Promise<void> {
  const { engineerOfRecord } = office.people;
  const prepared = need(await prepareSeal(engineerOfRecord, { submittalId }));
  const cms = await signPrepared(engineerOfRecord, prepared);
  need(await completeSeal(engineerOfRecord, { preparedId: prepared.preparedId, cms }));
}

/** Sends a sealed submittal; answers the token of the link in the letter. */
export async function sendTo(office: Office, submittalId: string): Promise<string> {
  const input = { submittalId, reviewer: 'R. Viewer', email: 'reviewer@authority.example', days: 30 };
  need(await sendSubmittal(office.people.engineer, input));
  const [mail] = await database()('mails').where({ submittal_id: submittalId }).orderBy('next_try', 'desc');
  return /\/review\/(\S+)/.exec(mail.body)?.[1] as string;
}

export async function reviewLinkOf(token: string): Promise<ReviewLinkRow> {
  const door = await reviewDoor(token, `test-${Math.random()}`);
  if (!door.open) throw new Error(`the link is ${door.why}`);
  return door.link;
}
