// server only
import { Mysql2Adapter } from '@lucia-auth/adapter-mysql';
import { Lucia, TimeSpan } from 'lucia';
import { database } from '@/db/connection';
import type { Actor } from './actor';
import { actorById } from './read-actor';
import { newToken, tokenHash } from './token';

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia;
    DatabaseSessionAttributes: { office_id: string };
  }
}

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
export async function startSession(
  personId: string,
  officeId: string,
): Promise<{ token: string; expiresAt: Date }> {
  const token = newToken();
  const session = await lucia.createSession(
    personId,
    { office_id: officeId },
    { sessionId: tokenHash(token) },
  );
  return { token, expiresAt: session.expiresAt };
}

/** Whose session this is, while it lasts and the person is active. */
export async function readSession(token: string): Promise<Actor | undefined> {
  const { session } = await lucia.validateSession(tokenHash(token));
  return session ? actorById(session.userId) : undefined;
}

export async function endSession(token: string): Promise<void> {
  await lucia.invalidateSession(tokenHash(token));
}

/** Signs a person out everywhere. */
export async function endAllSessions(personId: string): Promise<void> {
  await lucia.invalidateUserSessions(personId);
}

/** Signs a person out everywhere but in the session of this token. */
export async function endOtherSessions(personId: string, token: string): Promise<void> {
  const own = tokenHash(token);
  for (const session of await lucia.getUserSessions(personId))
    if (session.id !== own) await lucia.invalidateSession(session.id);
}
