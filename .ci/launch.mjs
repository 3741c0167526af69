import { mkdirSync } from 'node:fs';
import { resolve } from 'node:path';
import { freePort } from './free-port.mjs';
import { installDebian, installPackages, requireNode } from './install.mjs';
import { startMariadb } from './mariadb.mjs';
import { build, prepareDatabase, serve, startFakes } from './site.mjs';

const say = (text) => process.stdout.write(`${text}\n`);
const stops = [];
let leaving = false;

async function leave(code) {
  if (leaving) return;
  leaving = true;
  for (const stop of stops.reverse()) await stop();
  process.exit(code);
}

async function launch() {
  requireNode();
  const folder = resolve('.data');
  mkdirSync(folder, { recursive: true });
  const own = process.env.DATABASE_URL === undefined;
  if (own) await installDebian({ tests: false });
  await installPackages();
  const database = own ? await startMariadb(folder) : { url: process.env.DATABASE_URL, stop: async () => {} };
  stops.push(database.stop);
  const wanted = Number(process.env.PORT ?? 3000);
  const port = await freePort(wanted);
  if (port !== wanted) say(`Port ${wanted} is taken; ${port} is used.`);
  const base = {
    ...process.env,
    DATABASE_URL: database.url,
    APP_URL: process.env.APP_URL ?? `http://127.0.0.1:${port}`,
    NODE_ENV: 'production',
  };
  const fakes = await startFakes(folder, base);
  stops.push(fakes.stop);
  const env = { ...fakes.settings, ...base };
  await prepareDatabase(env, { demo: true });
  await build(env);
  const site = await serve(env, port);
  stops.push(site.stop);
  site.child.once('exit', (code) => leave(code ?? 1));
  say(`\nFairhand is at ${site.address}\n`);
  say('Demo office Lindqvist & Arrow; every password is: plumb-line-and-level');
  say('  ines.arrow@lindqvist-arrow.example     administrator');
  say('  tomas.lindqvist@lindqvist-arrow.example engineer of record, licensed');
  say('  mira.oduya@lindqvist-arrow.example      engineer');
  say('  jonas.weir@lindqvist-arrow.example      checker');
  say(
    `Key file of the demo engineer of record: ${env.DEMO_FOLDER}/tomas-lindqvist.p12, password: plumb-line`,
  );
  say(`Mail that the demo sends: ${site.address}/demo/mail`);
  say('\nCtrl C stops everything; what was entered stays.');
}

process.on('SIGINT', () => leave(0));
process.on('SIGTERM', () => leave(0));
launch().catch(async (error) => {
  process.stderr.write(`\n${error.message}\n`);
  await leave(1);
});
