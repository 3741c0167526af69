import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from './free-port.mjs';
import { installDebian, installPackages, requireNode } from './install.mjs';
import { startMariadb } from './mariadb.mjs';
import { run } from './run-command.mjs';
import { runTests, totals } from './run-tests.mjs';
import { build, prepareDatabase, serve, startFakes } from './site.mjs';

const say = (text) => process.stdout.write(`${text}\n`);
const bin = (path, ...args) => ['node', [`node_modules/${path}`, ...args]];
const stops = [];
const failures = [];
let leaving = false;

/** One stage with its time. A failure is noted and the next stage goes on; one that the rest needs ends the run. */
async function stage(name, work, { needed = false } = {}) {
  const start = Date.now();
  say(`\n— ${name}`);
  try {
    await work();
  } catch (error) {
    failures.push(`${name}: ${error.message}`);
    process.stderr.write(`${error.message}\n`);
    if (needed) throw error;
  } finally {
    say(`  ${name}: ${((Date.now() - start) / 1000).toFixed(1)} s`);
  }
}

async function verify() {
  requireNode();
  const folder = mkdtempSync(join(tmpdir(), 'fairhand-verify-'));
  stops.push(() => rmSync(folder, { recursive: true, force: true }));
  const install = async () => {
    await installDebian({ tests: true });
    await installPackages();
  };
  await stage('install', install, { needed: true });
  const env = { ...process.env, NODE_ENV: 'production', LOG_LEVEL: 'error' };
  const testing = { ...env, NODE_ENV: 'test' };
  await stage('lint', () => run(...bin('@biomejs/biome/bin/biome', 'check', '.')));
  await stage('types', async () => {
    await run(...bin('next/dist/bin/next', 'typegen'), { env });
    await run(...bin('typescript/bin/tsc', '--noEmit'));
  });
  await stage('unit tests', () => runTests('vitest.config.ts', testing, folder));

  const port = await freePort(4310);
  const all = { ...env, APP_URL: `http://127.0.0.1:${port}` };
  const start = async () => {
    const database = await startMariadb(folder);
    stops.push(database.stop);
    all.DATABASE_URL = database.url;
    const fakes = await startFakes(folder, all);
    stops.push(fakes.stop);
    Object.assign(all, fakes.settings);
    await prepareDatabase(all, 'none');
  };
  await stage('database and stand-ins', start, { needed: true });
  await stage('database tests', () =>
    runTests('tests/database/vitest.config.ts', { ...all, NODE_ENV: 'test' }, folder),
  );
  await stage('build', () => build(all), { needed: true });
  await stage('browser tests', async () => {
    await prepareDatabase(all, 'demo');
    const site = await serve(folder, all, port);
    stops.push(site.stop);
    const browsing = { ...all, NODE_ENV: 'test', SITE_URL: site.address };
    await runTests('tests/browser/vitest.config.ts', browsing, folder);
  });
}

async function leave() {
  if (leaving) return;
  leaving = true;
  for (const stop of stops.reverse()) await stop();
  if (failures.length > 0) say(`\nNot passed:\n${failures.map((f) => `  ${f}`).join('\n')}`);
  say(`\n${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
  process.exit(failures.length === 0 ? 0 : 1);
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    failures.push(`stopped by ${signal}`);
    leave();
  });
}
verify()
  .catch((error) => {
    if (failures.length === 0) failures.push(error.message);
  })
  .finally(leave);
