import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const folders = ['app', 'lib', 'db', 'templates', 'fonts', 'public'];
const files = [
  'instrumentation.ts',
  'next.config.ts',
  'package-lock.json',
  'postcss.config.mjs',
  'proxy.ts',
  'tailwind.config.ts',
  'tsconfig.json',
];

/** SHA-256 over every source that the build reads, and the name of Node's version. */
export function sourceDigest() {
  const hash = createHash('sha256').update(process.version);
  const add = (path) => hash.update(path).update(readFileSync(path));
  const walk = (folder) => {
    const entries = readdirSync(folder, { withFileTypes: true });
    for (const entry of entries.sort((a, b) => (a.name < b.name ? -1 : 1))) {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) walk(path);
      else add(path);
    }
  };
  for (const folder of folders) if (existsSync(folder)) walk(folder);
  for (const file of files) if (existsSync(file)) add(file);
  return hash.digest('hex');
}
