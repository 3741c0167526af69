import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { has, run } from './run-command.mjs';

const debian = [
  { program: 'mariadbd', package: 'mariadb-server-core' },
  { program: 'mariadb', package: 'mariadb-client-core' },
  { program: 'chromium', package: 'chromium', tests: true },
  { program: 'pdftotext', package: 'poppler-utils', tests: true },
  { program: 'qpdf', package: 'qpdf', tests: true },
  { program: 'openssl', package: 'openssl', tests: true },
  { program: 'unzip', package: 'unzip', tests: true },
];

/** Installs Debian packages that are missing; the tests need a browser and PDF readers besides MariaDB. */
export async function installDebian({ tests }) {
  const missing = debian.filter((d) => (tests || !d.tests) && !has(d.program)).map((d) => d.package);
  if (missing.length === 0) return;
  const asRoot = `apt-get install ${missing.join(' ')}`;
  if (!has('apt-get')) throw new Error(`Missing: ${missing.join(', ')} (names of Debian packages).`);
  const root = process.getuid?.() === 0;
  if (!root && !has('sudo')) throw new Error(`Packages are missing. Install them as root: ${asRoot}`);
  process.stdout.write(`Installing Debian packages: ${missing.join(' ')}\n`);
  const [command, first] = root ? ['apt-get', []] : ['sudo', ['apt-get']];
  const common = [...first, '-o', 'DPkg::Lock::Timeout=600', '-qq'];
  const options = {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    stdio: ['inherit', 'ignore', 'inherit'],
  };
  try {
    await run(command, [...common, 'update'], options);
    await run(command, [...common, 'install', '-y', '--no-install-recommends', ...missing], options);
  } catch (error) {
    throw new Error(`Packages could not be installed (${error.message}). Install them as root: ${asRoot}`);
  }
}

/** npm ci when the lock file is not the one that was installed last. */
export async function installPackages() {
  const digest = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  const stamp = 'node_modules/.fairhand-lock';
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return;
  process.stdout.write('Installing npm packages\n');
  // Types and the style compiler are needed for the build, also where NODE_ENV says production.
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  await run('npm', args);
  mkdirSync('node_modules', { recursive: true });
  writeFileSync(stamp, digest);
}

export function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19))
    throw new Error(`Node ${process.versions.node} is too old; 20.19 or newer is needed.`);
}
