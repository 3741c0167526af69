// server only
import { createHash, randomBytes } from 'node:crypto';
import { toBase32 } from './base32';

/** Ten codes of 80 random bits each, as "abcd-efgh-ijkl-mnop"; shown once, kept as hashes. */
export function newRecoveryCodes(): string[] {
  return Array.from({ length: 10 }, () =>
    (toBase32(randomBytes(10)).toLowerCase().match(/.{4}/g) ?? []).join('-'),
  );
}

/** Hash of a recovery code however it was typed. The codes are random enough that one quick hash protects them. */
export function recoveryHash(code: string): string {
  return createHash('sha256')
    .update(code.toLowerCase().replace(/[^a-z2-7]/g, ''))
    .digest('hex');
}
