// server only
import { readFileSync } from 'node:fs';
import { env } from '@/lib/env';
import { readPem } from '@/lib/signing/certificate-pem';
import type { Trust } from '@/lib/signing/check-signature';

/** The authorities whose certificates may seal and stamp here. Without any, nothing can be sealed. */
export function trust(): Trust | undefined {
  const file = env().trustPemFile;
  if (file === undefined) return undefined;
  const anchors = readPem(readFileSync(file, 'utf8'));
  return { anchors, stampAnchors: anchors };
}
