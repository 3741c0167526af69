import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run-command.mjs';

const tsx = ['--import', 'tsx'];

/** Brings the database to the newest shape, and fills an empty one with the demo office. */
export async function prepareDatabase(env, { demo }) {
  const knex = [...tsx, 'node_modules/knex/bin/cli.js', '--knexfile', 'knexfile.ts'];
  await run('node', [...knex, 'migrate:latest'], { env, stdio: ['ignore', 'ignore', 'inherit'] });
  if (demo) await run('node', [...knex, 'seed:run'], { env, stdio: ['ignore', 'ignore', 'inherit'] });
}

/** Builds when a source changed since the last build. */
export async function build(env) {
  const digest = sourceDigest();
  const stamp = '.next/fairhand-sources';
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return;
  await run('node', ['node_modules/next/dist/bin/next', 'build'], { env });
  writeFileSync(stamp, digest);
}

function sourceDigest() {
  const hash = createHash('sha256');
  const walk = (path) => {
    for (const name of readdirSync(path).sort()) {
      const at = join(path, name);
      if (statSync(at).isDirectory()) walk(at);
      else hash.update(at).update(readFileSync(at));
    }
  };
  for (const folder of ['app', 'lib', 'db', 'templates', 'fonts']) walk(folder);
  for (const file of ['package-lock.json', 'next.config.ts', 'tailwind.config.ts', 'tsconfig.json'])
    hash.update(readFileSync(file));
  return hash.digest('hex');
}

/** Starts the local stand-ins for mail and time stamps; answers the settings that point at them. */
export async function startFakes(folder, env) {
  mkdirSync(join(folder, 'demo'), { recursive: true });
  const child = spawn('node', [...tsx, 'lib/mail/run-fakes.ts', join(folder, 'demo')], {
    env,
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const line = await new Promise((resolve, reject) => {
    child.stdout.once('data', (data) => resolve(String(data)));
    child.once('exit', (code) =>
      reject(new Error(`The local mail and time-stamp servers ended with ${code}.`)),
    );
  });
  return { settings: JSON.parse(line), stop: () => child.kill('SIGTERM') };
}

/** Serves the built application; resolves when it answers. */
export async function serve(env, port) {
  const child = spawn(
    'node',
    ['node_modules/next/dist/bin/next', 'start', '-H', '127.0.0.1', '-p', String(port)],
    { env, stdio: ['ignore', 'ignore', 'inherit'] },
  );
  const address = `http://127.0.0.1:${port}`;
  for (let i = 0; i < 150; i++) {
    if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode} while starting.`);
    const answer = await fetch(`${address}/sign-in`).catch(() => undefined);
    if (answer?.ok) return { address, child, stop: () => child.kill('SIGTERM') };
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  child.kill('SIGTERM');
  throw new Error('The server did not answer within thirty seconds.');
}
