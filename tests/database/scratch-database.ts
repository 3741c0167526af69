import { execFileSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import knex from 'knex';

/** Makes a database for this run beside the one at DATABASE_URL, and drops it when the run is over. */
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
  return async () => {
    await server.raw('DROP DATABASE ??', [name]);
    await server.destroy();
  };
}

/** Runs the Knex command line, as launch does. */
export function migrate(command: 'migrate:latest' | 'migrate:rollback', ...more: string[]): void {
  const cli = ['--import', 'tsx', 'node_modules/knex/bin/cli.js', '--knexfile', 'knexfile.ts'];
  execFileSync(process.execPath, [...cli, command, ...more], { stdio: ['ignore', 'ignore', 'inherit'] });
}
