import type { Knex } from 'knex';
import { createConnection, type RowDataPacket } from 'mysql2/promise';
import { env } from '../lib/env';
import { Unusable } from '../lib/unusable';
import { closeDatabase, database } from './connection';
import { seed as seedDemo } from './seeds/demo';
import { seed as seedOffice } from './seeds/office';

/** Fails in plain words when the database does not answer, or cannot keep a package. */
async function tryDatabase(url: string): Promise<void> {
  const { host } = new URL(url);
  const connection = await createConnection({ uri: url, connectTimeout: 10_000 }).catch((error: Error) => {
    throw new Unusable(`The database of DATABASE_URL does not answer at ${host}: ${error.message}`);
  });
  try {
    const [rows] = await connection.query<RowDataPacket[]>(
      'SELECT VERSION() AS version, @@max_allowed_packet AS packet',
    );
    const { version, packet } = rows[0] as RowDataPacket;
    if (!/mariadb/i.test(String(version)))
      throw new Unusable(`DATABASE_URL leads to ${version}; MariaDB is needed.`);
    if (Number(packet) < 128 * 1024 * 1024)
      throw new Unusable(
        `max_allowed_packet of the database is ${packet} bytes; packages need 128 MB (134217728).`,
      );
  } finally {
    await connection.end();
  }
}

/** Checks the settings, brings the database to the newest shape, and fills an empty one as asked: demo, office, or none. */
async function prepare(fill: string | undefined): Promise<void> {
  await tryDatabase(env().databaseUrl);
  const db: Knex = database();
  await db.migrate.latest({ directory: './db/migrations', extension: 'ts' });
  if (fill === 'demo') await seedDemo(db);
  if (fill === 'office') await seedOffice(db);
}

try {
  await prepare(process.argv[2]);
} catch (error) {
  const said = error instanceof Unusable ? error.message : error instanceof Error ? error.stack : error;
  process.stderr.write(`${said}\n`);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
