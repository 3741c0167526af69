import { mkdirSync } from 'node:fs';
import { resolve } from 'node:path';
import { freePort, readPort } from './free-port.mjs';
import { installDebian, installPackages, requireNode } from './install.mjs';
import { endLeftOver, remember, running } from './left-over.mjs';
import { startMariadb } from './mariadb.mjs';
import { build, prepareDatabase, serve, startFakes } from './site.mjs';
import { welcome } from './welcome.mjs';

const say = (text) => process.stdout.write(`${text}\n`);
const stops = [];
let leaving = false;

/** Stops what was started, in reverse order; what was entered stays. */
async function leave(code) {
  if (leaving) return;
  leaving = true;
  for (const stop of stops.reverse()) await stop();
  process.exit(code);
}

function watch(child, name) {
  child.once('exit', (code, signal) => {
    if (leaving) return;
    process.stderr.write(`\n${name} ended unexpectedly with ${code ?? signal}; everything is stopped.\n`);
    leave(1);
  });
}

/** The project's own MariaDB, or the one that DATABASE_URL names. */
async function openDatabase(folder) {
  if (process.env.DATABASE_URL) return process.env.DATABASE_URL;
  const database = await startMariadb(folder);
  stops.push(database.stop);
  watch(database.child, 'MariaDB');
  return database.url;
}

async function launch() {
  requireNode();
  const wanted = readPort(process.env.PORT ?? '3000');
  const demo = process.env.DEMO !== 'off';
  if (!demo && !process.env.SMTP_URL)
    throw new Error('DEMO=off needs SMTP_URL, the mail server that letters leave by.');
  const folder = resolve('.data');
  mkdirSync(folder, { recursive: true });
  const other = running(folder, 'launch');
  if (other) throw new Error(`Fairhand runs already (process ${other.pid}). Stop it there first.`);
  stops.push(remember(folder, 'launch', process.pid));
  await endLeftOver(folder, 'launch');

  if (!process.env.DATABASE_URL) await installDebian({ tests: false });
  await installPackages();
  const databaseUrl = await openDatabase(folder);
  const port = await freePort(wanted);
  if (port !== wanted) say(`Port ${wanted} is taken; ${port} is used.`);
  const address = process.env.APP_URL || `http://127.0.0.1:${port}`;
  const base = { ...process.env, DATABASE_URL: databaseUrl, APP_URL: address, NODE_ENV: 'production' };
  let env = base;
  if (demo) {
    const fakes = await startFakes(folder, base);
    stops.push(fakes.stop);
    watch(fakes.child, 'The local mail and time-stamp server');
    env = { ...fakes.settings, ...base };
  }
  await prepareDatabase(env, demo ? 'demo' : 'office');
  await build(env);
  const site = await serve(folder, env, port);
  stops.push(site.stop);
  watch(site.child, 'The server');
  say(welcome({ address: site.address, demoFolder: demo ? env.DEMO_FOLDER : undefined }));
}

process.on('SIGINT', () => leave(0));
process.on('SIGTERM', () => leave(0));
process.on('SIGHUP', () => leave(0));
launch().catch(async (error) => {
  if (!leaving) process.stderr.write(`\n${error.message}\n`);
  await leave(1);
});
