import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { has, run } from './run-command.mjs';

const debian = [
  { program: 'mariadbd', packages: ['mariadb-server-core', 'mariadb-client-core'] },
  { program: 'chromium', packages: ['chromium'], tests: true },
  { program: 'pdftotext', packages: ['poppler-utils'], tests: true },
  { program: 'qpdf', packages: ['qpdf'], tests: true },
  { program: 'openssl', packages: ['openssl'], tests: true },
];

/** Installs Debian packages that are missing; the tests need a browser and PDF readers besides MariaDB. */
export async function installDebian({ tests }) {
  const missing = debian.filter((d) => (tests || !d.tests) && !has(d.program)).flatMap((d) => d.packages);
  if (missing.length === 0) return;
  const root = process.getuid?.() === 0;
  if (!root && !has('sudo')) {
    throw new Error(
      `These packages are missing: ${missing.join(' ')}. Install them as root: apt-get install ${missing.join(' ')}`,
    );
  }
  const [command, first] = root ? ['apt-get', []] : ['sudo', ['apt-get']];
  const lock = ['-o', 'DPkg::Lock::Timeout=600'];
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  await run(command, [...first, ...lock, 'update', '-qq'], { env });
  await run(command, [...first, ...lock, 'install', '-y', '-qq', '--no-install-recommends', ...missing], {
    env,
    stdio: ['ignore', 'ignore', 'inherit'],
  });
}

/** npm ci when the lock file is not the one that was installed last. */
export async function installPackages() {
  const digest = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  const stamp = 'node_modules/.fairhand-lock';
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return;
  await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  mkdirSync('node_modules', { recursive: true });
  writeFileSync(stamp, digest);
}

export function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19))
    throw new Error(`Node ${process.versions.node} is too old; 20.19 or newer is needed.`);
}
