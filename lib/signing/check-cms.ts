// server only
import type { Bytes } from './bytes';
import { type CheckedSignature, checkSignature, type Trust } from './check-signature';
import { SignatureRefusal } from './signature-refusal';

/** Who is to seal, as the office's licence register names them. */
export interface Person {
  readonly name: string;
  readonly licenceNumber: string;
}

function same(a: string | undefined, b: string): boolean {
  const plain = (text: string) => text.normalize('NFC').replace(/\s+/g, ' ').trim();
  return a !== undefined && plain(a) === plain(b);
}

/**
 * Checks a signature as it arrives from a browser, before it is stamped and stored: detached, over exactly `content`, by
 * the person who was to sign, with a certificate good at the server's clock. Throws SignatureRefusal.
 */
export async function checkCms(
  cms: Bytes,
  content: Uint8Array,
  person: Person,
  trust: Trust,
  now: Date,
): Promise<CheckedSignature> {
  const checked = await checkSignature(cms, content, trust, now, true);
  if (checked.stamp) throw new SignatureRefusal('time-stamp-wrong', 'stamped before it arrived');
  const { name, licenceNumber } = checked.holder;
  if (!same(name, person.name) || !same(licenceNumber, person.licenceNumber)) {
    throw new SignatureRefusal('another-person', `${name}, ${licenceNumber}`);
  }
  return checked;
}
