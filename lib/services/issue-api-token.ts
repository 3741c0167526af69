// server only
import { z } from 'zod';
import { insertApiToken } from '@/db/queries/api-tokens';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { newToken, tokenHash } from './token';

const input = z.object({
  name: z.string().trim().min(1, 'Say what the token is for.').max(80),
  days: z.coerce.number().int().min(1).max(366),
});

/** Gives an engineer a token for programs. It is shown once; the database knows only its hash. */
export async function issueApiToken(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ token: string; expiresAt: Date }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { name, days } = parsed.data;
  const token = newToken();
  const madeAt = new Date();
  const expiresAt = new Date(madeAt.getTime() + days * 86_400_000);
  return inTransaction(actor, async (trx, record) => {
    const id = tokenHash(token);
    await insertApiToken(trx, {
      id,
      office_id: actor.officeId,
      person_id: actor.personId,
      name,
      made_at: madeAt,
      expires_at: expiresAt,
      revoked_at: null,
    });
    await record('issued a token', name, { aboutId: id });
    return { token, expiresAt };
  });
}
