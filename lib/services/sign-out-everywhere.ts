// server only
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { everyone, requireRole } from './require-role';
import { endAllSessions } from './session';

/** Ends every session of the person, on every machine. */
export async function signOutEverywhere(actor: Actor): Promise<void> {
  requireRole(actor, ...everyone);
  await inTransaction(actor, (_, record) =>
    record('signed out everywhere', actor.name, { aboutId: actor.personId }),
  );
  await endAllSessions(actor.personId);
}
