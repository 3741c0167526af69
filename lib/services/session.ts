// server only
import { Mysql2Adapter } from '@lucia-auth/adapter-mysql';
import { Lucia, TimeSpan } from 'lucia';
import { database } from '@/db/connection';
import { personWithOffice } from '@/db/queries/people';
import { type Actor, role } from './actor';
import { newToken, tokenHash } from './token';

/** Lucia's adapter needs only these two of a mysql2 pool; Knex's pool answers both. */
const pool = {
  query: (sql: string, values?: unknown[]) => run(sql, values),
  execute: (sql: string, values?: unknown[]) => run(sql, values),
};

async function run(sql: string, values: unknown[] | undefined) {
  return database().raw(sql, (values ?? []) as never);
}

const lucia = new Lucia(new Mysql2Adapter(pool as never, { user: 'people', session: 'sessions' }), {
  sessionExpiresIn: new TimeSpan(14, 'd'),
});

/** Starts a session. The token goes into the cookie; the database knows only its hash. */
export async function startSession(personId: string): Promise<{ token: string; expiresAt: Date }> {
  const token = newToken();
  const session = await lucia.createSession(personId, {}, { sessionId: tokenHash(token) });
  return { token, expiresAt: session.expiresAt };
}

export async function readSession(token: string): Promise<Actor | undefined> {
  const { session } = await lucia.validateSession(tokenHash(token));
  if (!session) return undefined;
  const row = await personWithOffice(database(), session.userId);
  if (!row?.active) return undefined;
  return {
    personId: row.id,
    officeId: row.office_id,
    officeName: row.office_name,
    zone: row.zone,
    roles: role.array().parse(row.roles),
    name: row.name,
    initials: row.initials,
    email: row.email,
  };
}

export async function endSession(token: string): Promise<void> {
  await lucia.invalidateSession(tokenHash(token));
}

export async function endAllSessions(personId: string): Promise<void> {
  await lucia.invalidateUserSessions(personId);
}
