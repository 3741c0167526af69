// server only
import { createHash, randomBytes } from 'node:crypto';

/** A secret for a link or a cookie; only its hash is stored. */
export function newToken(): string {
  return randomBytes(24).toString('base64url');
}

export function tokenHash(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
