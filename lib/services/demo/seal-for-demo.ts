// server only
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { env } from '@/lib/env';
import { buildCms } from '@/lib/signing/build-cms';
import { demoKeyPassword } from '@/lib/signing/demo-keys';
import { openKeyFile } from '@/lib/signing/open-key-file';
import { signedPart } from '@/lib/signing/signed-part';
import type { Actor } from '../actor';
import { completeSeal } from '../complete-seal';
import { prepareSeal } from '../prepare-seal';
import { readPreparedFile } from '../read-file';
import { need } from './need';

/** Seals a submittal with the demo's own key, as the browser of its engineer of record would. */
export async function sealForDemo(actor: Actor, submittalId: string): Promise<void> {
  const folder = env().demoFolder;
  if (!folder) throw new Error('the demo has no folder with a key');
  const prepared = need(await prepareSeal(actor, { submittalId }));
  const key = await openKeyFile(
    new Uint8Array(await readFile(join(folder, 'tomas-lindqvist.p12'))),
    demoKeyPassword,
  );
  const bytes = new Uint8Array(await readPreparedFile(actor, prepared.preparedId));
  const digest = await crypto.subtle.digest(key.hash, signedPart(bytes, prepared.hole));
  const cms = await buildCms(new Uint8Array(digest), key);
  need(await completeSeal(actor, { preparedId: prepared.preparedId, cms }));
}
