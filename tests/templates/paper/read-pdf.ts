import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Runs a tool (poppler, qpdf) on a file of these bytes; "@" among its arguments stands for the file. */
function run(bytes: Uint8Array, tool: string, args: readonly string[]): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'paper-'));
  try {
    const file = path.join(folder, 'file.pdf');
    writeFileSync(file, bytes);
    return execFileSync(
      tool,
      args.map((arg) => (arg === '@' ? file : arg)),
      { encoding: 'utf8' },
    );
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Text of one page (from 1) or of all, laid out as on the page. */
export function textOf(bytes: Uint8Array, page?: number): string {
  const range = page === undefined ? [] : ['-f', `${page}`, '-l', `${page}`];
  return run(bytes, 'pdftotext', ['-layout', ...range, '@', '-']);
}

/** What `qpdf --check` prints; it fails the test by its exit code when the file is damaged. */
export const checkFile = (bytes: Uint8Array): string => run(bytes, 'qpdf', ['--check', '@']);

/** Name and "embedded" column of each font of the file. */
export function fontsOf(bytes: Uint8Array): { name: string; embedded: boolean }[] {
  const [, , ...rows] = run(bytes, 'pdffonts', ['@']).trim().split('\n');
  return rows.map((row) => ({
    name: row.split(' ')[0] ?? '',
    embedded: /\s(yes|no)\s/.exec(row)?.[1] === 'yes',
  }));
}

export const infoOf = (bytes: Uint8Array): string => run(bytes, 'pdfinfo', ['@']);
export const destinationsOf = (bytes: Uint8Array): string => run(bytes, 'pdfinfo', ['-dests', '@']);
export const attachmentsOf = (bytes: Uint8Array): string => run(bytes, 'pdfdetach', ['-list', '@']);

/** Words of a page with where they end, points from its top. */
export function wordsOf(bytes: Uint8Array, page: number): { text: string; bottom: number }[] {
  const boxes = run(bytes, 'pdftotext', ['-bbox', '-f', `${page}`, '-l', `${page}`, '@', '-']);
  return [...boxes.matchAll(/yMax="([\d.]+)">([^<]*)<\/word>/g)].map(([, bottom, text = '']) => ({
    text,
    bottom: Number(bottom),
  }));
}
