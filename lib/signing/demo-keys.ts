// server only
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { writePem } from './certificate-pem';
import { demoAuthorityName, makeDemoAuthority } from './demo-authority';
import { openKeyFile } from './open-key-file';
import type { Signer } from './signer';

/** The licensed engineer of the demo, and the password of the demo's key files: invented, and known to everybody. */
export const demoEngineer = {
  name: 'Tomas Lindqvist',
  licenceNumber: 'SE 20417',
  organization: 'Lindqvist & Arrow',
};
export const demoKeyPassword = 'plumb-line';

/**
 * The demo's keys, made once and kept as files: the authority's certificate, the engineer's key file, the key of the time
 * stamps. An authority lives only while it issues them, so nobody can add to it later.
 */
export async function demoKeys(folder: string): Promise<{ timeStamper: Signer }> {
  const at = (name: string) => join(folder, name);
  if (!existsSync(at('time-stamps.p12'))) {
    const authority = await makeDemoAuthority();
    const engineer = await authority.issueKeyFile(demoEngineer, demoKeyPassword);
    const stamps = await authority.issueTimeStampKeyFile(demoKeyPassword);
    writeFileSync(at('demo-authority.pem'), writePem([authority.certificate]));
    writeFileSync(at('tomas-lindqvist.p12'), engineer.file);
    writeFileSync(at('time-stamps.p12'), stamps.file);
  }
  const file = new Uint8Array(readFileSync(at('time-stamps.p12')));
  const suits = (certificate: Signer['certificate']) =>
    certificate.issuer.typesAndValues.some((t) => t.value.valueBlock.value === demoAuthorityName);
  return { timeStamper: await openKeyFile(file, demoKeyPassword, { suits }) };
}
