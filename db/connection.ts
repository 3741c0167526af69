// server only
import knex, { type Knex } from 'knex';
import { env } from '@/lib/env';

const place = globalThis as { fairhandDatabase?: Knex };

/** Settings of a connection to MariaDB: numbers above 2^53 arrive as text, times are UTC. */
export function connectionSettings(url: string): Knex.Config {
  return {
    client: 'mysql2',
    connection: { uri: url, supportBigNumbers: true, timezone: 'Z' } as Knex.MySql2ConnectionConfig,
    pool: { min: 0, max: 10 },
  };
}

/** Closes the pool of this process, so that it can end. */
export async function closeDatabase(): Promise<void> {
  await place.fairhandDatabase?.destroy();
  place.fairhandDatabase = undefined;
}

/** The pool of this process; development reloads keep it. */
export function database(): Knex {
  place.fairhandDatabase ??= knex(connectionSettings(env().databaseUrl));
  return place.fairhandDatabase;
}
