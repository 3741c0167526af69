import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from './free-port.mjs';
import { installDebian, installPackages, requireNode } from './install.mjs';
import { startMariadb } from './mariadb.mjs';
import { run } from './run-command.mjs';
import { build, prepareDatabase, serve, startFakes } from './site.mjs';

const say = (text) => process.stdout.write(`${text}\n`);
const node = (path, ...args) => ['node', [`node_modules/${path}`, ...args]];
const stops = [];
const totals = { passed: 0, failed: 0, skipped: 0 };

async function stage(name, work) {
  const start = Date.now();
  say(`\n— ${name}`);
  await work();
  say(`  ${name}: ${((Date.now() - start) / 1000).toFixed(1)} s`);
}

async function tests(env, folder, config) {
  const report = join(folder, `${config.replaceAll('/', '-')}.json`);
  const [command, args] = node(
    'vitest/vitest.mjs',
    'run',
    '--config',
    config,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  );
  const failed = await run(command, args, { env }).then(
    () => undefined,
    (error) => error,
  );
  const read = JSON.parse(readFileSync(report, 'utf8'));
  totals.passed += read.numPassedTests;
  totals.failed += read.numFailedTests;
  totals.skipped += read.numPendingTests;
  if (failed) throw failed;
}

async function verify() {
  requireNode();
  const folder = mkdtempSync(join(tmpdir(), 'fairhand-verify-'));
  stops.push(async () => rmSync(folder, { recursive: true, force: true }));
  await stage('install', async () => {
    await installDebian({ tests: true });
    await installPackages();
  });
  const env = { ...process.env, NODE_ENV: 'production', LOG_LEVEL: 'error' };
  const unit = { ...env, NODE_ENV: 'test' };
  await stage('lint', () => run(...node('@biomejs/biome/bin/biome', 'check', '.')));
  await stage('types', async () => {
    await run(...node('next/dist/bin/next', 'typegen'), { env });
    await run(...node('typescript/bin/tsc', '--noEmit'));
  });
  await stage('unit tests', () => tests(unit, folder, 'vitest.config.ts'));
  const database = await startMariadb(folder);
  stops.push(database.stop);
  const port = await freePort(4310);
  const base = { ...env, DATABASE_URL: database.url, APP_URL: `http://127.0.0.1:${port}` };
  const fakes = await startFakes(folder, base);
  stops.push(fakes.stop);
  const all = { ...fakes.settings, ...base };
  await stage('database tests', async () => {
    await prepareDatabase(all, { demo: false });
    await tests({ ...all, NODE_ENV: 'test' }, folder, 'tests/database/vitest.config.ts');
  });
  await stage('build', () => build(all));
  await stage('browser tests', async () => {
    await prepareDatabase(all, { demo: true });
    const site = await serve(all, port);
    stops.push(site.stop);
    await tests(
      { ...all, NODE_ENV: 'test', SITE_URL: site.address },
      folder,
      'tests/browser/vitest.config.ts',
    );
  });
}

async function leave(code) {
  for (const stop of stops.reverse()) await stop();
  say(`\n${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
  process.exit(code);
}

verify().then(
  () => leave(0),
  (error) => {
    process.stderr.write(`\n${error.message}\n`);
    return leave(1);
  },
);
