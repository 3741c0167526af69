import knex from 'knex';
import { env } from '../lib/env';
import { connectionSettings } from './connection';

/** Reads the settings and asks the database for an answer; says in plain words what has to be mended. */
async function check(): Promise<string | undefined> {
  let url: string;
  try {
    url = env().databaseUrl;
  } catch (error) {
    return error instanceof Error ? error.message : String(error);
  }
  const db = knex({ ...connectionSettings(url), acquireConnectionTimeout: 10_000, pool: { min: 0, max: 1 } });
  try {
    const [[row]] = await db.raw('SELECT VERSION() AS version, @@max_allowed_packet AS packet');
    if (!/mariadb/i.test(String(row.version)))
      return `DATABASE_URL leads to ${row.version}; MariaDB is needed.`;
    if (Number(row.packet) < 128 * 1024 * 1024)
      return `max_allowed_packet of the database is ${row.packet} bytes; packages need 128 MB (134217728).`;
    return undefined;
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return `The database that DATABASE_URL names does not answer at ${new URL(url).host}: ${why}`;
  } finally {
    await db.destroy();
  }
}

const wrong = await check();
if (wrong) {
  process.stderr.write(`${wrong}\n`);
  process.exitCode = 1;
}
