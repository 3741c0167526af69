import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { remember } from './left-over.mjs';
import { run } from './run-command.mjs';
import { sourceDigest } from './source-digest.mjs';

const tsx = ['--import', 'tsx'];

/** Next.js is asked to report to nobody. */
const silent = (env) => ({ ...env, NEXT_TELEMETRY_DISABLED: '1' });
const quiet = ['ignore', 'ignore', 'inherit'];

/** Checks the settings, brings the database to the newest shape, and fills an empty one: "demo", "office" or "none". */
export async function prepareDatabase(env, fill) {
  await run('node', [...tsx, 'db/prepare.ts', fill], { env }).catch(() => {
    throw new Error('The database could not be prepared; the lines above say why.');
  });
}

/** Builds when a source changed since the last build. */
export async function build(env) {
  const digest = sourceDigest();
  const stamp = '.next/fairhand-sources';
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return;
  await run('node', ['node_modules/next/dist/bin/next', 'build'], { env: silent(env) });
  writeFileSync(stamp, digest);
}

/** Starts the local stand-ins for mail and time stamps; answers the settings that point at them. */
export async function startFakes(folder, env) {
  mkdirSync(join(folder, 'demo'), { recursive: true });
  // Its input stays open as long as this process lives; the stand-ins end with it.
  const child = spawn('node', [...tsx, 'lib/mail/run-fakes.ts', join(folder, 'demo')], {
    env,
    stdio: ['pipe', 'pipe', 'inherit'],
  });
  const forget = remember(folder, 'stand-ins', child.pid);
  const line = await new Promise((resolve, reject) => {
    child.stdout.once('data', (data) => resolve(String(data)));
    child.once('exit', (code) =>
      reject(new Error(`The local mail and time-stamp servers ended with ${code}.`)),
    );
  });
  return { settings: JSON.parse(line), child, stop: () => end(child, forget) };
}

/** Serves the built application; resolves when it answers. */
export async function serve(folder, env, port) {
  const next = ['node_modules/next/dist/bin/next', 'start', '-H', '127.0.0.1', '-p', String(port)];
  const child = spawn('node', next, { env: silent(env), stdio: quiet });
  const forget = remember(folder, 'site', child.pid);
  const address = `http://127.0.0.1:${port}`;
  for (let i = 0; i < 150; i++) {
    if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode} while starting.`);
    const answer = await fetch(`${address}/sign-in`).catch(() => undefined);
    if (answer?.ok) return { address, child, stop: () => end(child, forget) };
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  await end(child, forget);
  throw new Error('The server did not answer within thirty seconds.');
}

async function end(child, forget) {
  if (child.exitCode === null && child.signalCode === null) {
    const ended = new Promise((resolve) => child.once('exit', resolve));
    child.kill('SIGTERM');
    await ended;
  }
  forget();
}
