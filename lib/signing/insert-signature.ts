// server only
import type { Bytes } from './bytes';
import { SignatureRefusal } from './signature-refusal';
import type { Hole } from './signed-part';

/** Writes a signature into the hole kept for it; no other byte changes. Throws SignatureRefusal when it is too long. */
export function insertSignature(prepared: { bytes: Uint8Array; hole: Hole }, cms: Uint8Array): Bytes {
  const { bytes, hole } = prepared;
  const digits = Buffer.from(cms).toString('hex');
  if (digits.length > hole.to - hole.from - 2) {
    throw new SignatureRefusal('signature-too-long', `${cms.length} bytes`);
  }
  const out = new Uint8Array(bytes);
  out.set(Buffer.from(digits, 'latin1'), hole.from + 1);
  return out;
}
