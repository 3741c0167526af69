import { execFileSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import knex from 'knex';
import { demoKeys } from '@/lib/signing/demo-keys';
import { startLocalTimeStampServer } from '@/lib/signing/local-time-stamp-server';

/**
 * Makes a database for this run beside the one at DATABASE_URL, and an authority of its own with the keys it issued and
 * its time stamps; drops all when the run is over.
 */
export default async function setup(): Promise<() => Promise<void>> {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL names the MariaDB that the database tests run against');
  const server = knex({ client: 'mysql2', connection: url });
  const name = `fairhand_tests_${randomBytes(4).toString('hex')}`;
  await server.raw('CREATE DATABASE ??', [name]);
  const scratch = new URL(url);
  scratch.pathname = `/${name}`;
  process.env.DATABASE_URL = scratch.href;
  migrate('migrate:latest');

  const folder = mkdtempSync(join(tmpdir(), 'fairhand-keys-'));
  const { timeStamper } = await demoKeys(folder);
  const stamps = await startLocalTimeStampServer(timeStamper);
  process.env.DEMO_FOLDER = folder;
  process.env.TRUST_PEM_FILE = join(folder, 'demo-authority.pem');
  process.env.TIME_STAMP_URL = stamps.url;
  process.env.LOG_LEVEL = 'silent';
  return async () => {
    await stamps.close();
    await server.raw('DROP DATABASE ??', [name]);
    await server.destroy();
    rmSync(folder, { recursive: true });
  };
}

/** Runs the Knex command line, as launch does. */
export function migrate(command: 'migrate:latest' | 'migrate:rollback', ...more: string[]): void {
  const cli = ['--import', 'tsx', 'node_modules/knex/bin/cli.js', '--knexfile', 'knexfile.ts'];
  execFileSync(process.execPath, [...cli, command, ...more], { stdio: ['ignore', 'ignore', 'inherit'] });
}
