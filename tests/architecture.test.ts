import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, normalize } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = process.cwd();

/** Each layer and those it may import from, itself included. */
const layers: Record<string, readonly string[]> = {
  'lib/units': ['lib/units'],
  'lib/model': ['lib/model', 'lib/units'],
  'lib/engine': ['lib/engine', 'lib/model', 'lib/units'],
  'lib/figures': ['lib/figures', 'lib/engine', 'lib/model', 'lib/units'],
  'lib/typeset': ['lib/typeset', 'lib/figures', 'lib/engine', 'lib/model', 'lib/units'],
  'lib/signing': ['lib/signing'],
  templates: ['templates', 'lib/typeset', 'lib/figures', 'lib/engine', 'lib/model', 'lib/units'],
  db: [
    'db',
    'lib/env',
    'lib/unusable',
    'lib/signing',
    'lib/services/demo',
    'lib/services/found-office',
    'lib/services/read-actor',
  ],
  'lib/mail': ['lib/mail', 'lib/signing', 'lib/env'],
  'lib/services': ['lib/', 'db', 'templates'],
  app: ['app', 'lib/', 'templates'],
};

/** Files below a folder, as paths from the root. */
function filesIn(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    if (entry.isDirectory()) return filesIn(path);
    return /\.tsx?$/.test(entry.name) ? [path] : [];
  });
}

/** What a file imports from within the project, as paths from the root. */
function importsOf(path: string): string[] {
  const text = readFileSync(join(root, path), 'utf8');
  const found = [...text.matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)].map((m) => m[1] as string);
  return found.flatMap((name) => {
    if (name.startsWith('@/')) return [name.slice(2)];
    if (name.startsWith('.')) return [normalize(join(dirname(path), name)).replaceAll('\\', '/')];
    return [];
  });
}

describe('imports point one way', () => {
  it.each(Object.keys(layers))('from %s', (layer) => {
    const allowed = layers[layer] as readonly string[];
    const stray = filesIn(layer).flatMap((path) =>
      importsOf(path)
        .filter(
          (target) => !allowed.some((a) => target === a || target.startsWith(a.endsWith('/') ? a : `${a}/`)),
        )
        .map((target) => `${path} → ${target}`),
    );
    expect(stray).toEqual([]);
  });

  it('and a module from outside is never taken for one of ours', () => {
    expect(importsOf('tests/architecture.test.ts')).toEqual([]);
  });
});

describe('what runs in the browser', () => {
  it('never reaches services, the database, the environment or the paper templates', () => {
    const clients = filesIn('app').filter((p) =>
      readFileSync(join(root, p), 'utf8').startsWith("'use client'"),
    );
    const reached = new Map<string, string>();
    const visit = (path: string, from: string) => {
      if (reached.has(path)) return;
      reached.set(path, from);
      if (readFileSync(join(root, path), 'utf8').startsWith("'use server'")) return;
      for (const target of importsOf(path)) {
        const text = readFileSync(join(root, path), 'utf8');
        const typeOnly = new RegExp(`import type [^;]*'[^']*${target.split('/').at(-1)}'`).test(text);
        const file = [`${target}.ts`, `${target}.tsx`].find((f) => allFiles.has(f));
        if (file && !typeOnly) visit(file, path);
      }
    };
    const allFiles = new Set(['app', 'lib', 'db', 'templates'].flatMap(filesIn));
    for (const path of clients) visit(path, path);
    const forbidden = [...reached].filter(
      ([path]) =>
        /^(db|templates\/paper)\//.test(path) ||
        (path.startsWith('lib/services/') && !/^lib\/services\/(result|actor|sheet-state)/.test(path)) ||
        path === 'lib/env.ts',
    );
    expect(
      forbidden.filter(([path]) => !readFileSync(join(root, path), 'utf8').startsWith("'use server'")),
    ).toEqual([]);
    expect(reached.size).toBeGreaterThan(20);
  });
});

describe('the environment', () => {
  it('is read in one place', () => {
    const readers = ['app', 'lib', 'db', 'templates']
      .flatMap(filesIn)
      .filter((p) => readFileSync(join(root, p), 'utf8').includes('process.env'));
    expect(readers).toEqual(['lib/env.ts']);
  });
});

describe('file names', () => {
  it('are kebab-case and say what is inside', () => {
    const names = ['app', 'lib', 'db', 'templates']
      .flatMap(filesIn)
      .map((p) => p.split('/').at(-1) as string);
    const odd = names.filter(
      (n) =>
        !/^[a-z0-9_]+([-.][a-z0-9_]+)*\.tsx?$/.test(n) ||
        /^(utils?|helpers?|common|misc|shared|index)\./.test(n),
    );
    expect(odd).toEqual([]);
  });
});
