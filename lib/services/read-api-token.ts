// server only
import { database } from '@/db/connection';
import { apiTokensOf, personOfApiToken } from '@/db/queries/api-tokens';
import type { Actor } from './actor';
import { actorById } from './read-actor';
import { makers, requireRole } from './require-role';
import { tokenHash } from './token';

/** The person a program's token stands for, while both are in force. */
export async function readApiToken(token: string): Promise<Actor | undefined> {
  const personId = await personOfApiToken(database(), tokenHash(token), new Date());
  return personId ? actorById(personId) : undefined;
}

/** One's own tokens, without their secrets. */
export async function listApiTokens(actor: Actor) {
  requireRole(actor, ...makers);
  const rows = await apiTokensOf(database(), actor.officeId, actor.personId);
  return rows.map((r) => ({
    id: r.id,
    name: r.name,
    madeAt: r.made_at,
    expiresAt: r.expires_at,
    revokedAt: r.revoked_at,
  }));
}
