import type { Block } from '@/templates/block';

/** One digit of one printed number of a document, to be changed. */
export interface Slip {
  block: number;
  /** Where in the block: the text itself, and the digit in it. */
  path: (string | number)[];
  at: number;
}

/** Every digit of the numbers of equations, tables and equalities in sentences; digits of names and powers are not numbers. */
export function slipsOf(blocks: readonly Block[]): Slip[] {
  const slips: Slip[] = [];
  const add = (block: number, path: (string | number)[], text: string) => {
    for (const at of digitsOf(text)) slips.push({ block, path, at });
  };
  blocks.forEach((b, i) => {
    if (b.kind === 'equations') {
      b.rows.forEach((row, r) => {
        if (row.chain.length === 0) add(i, ['rows', r, 'lhs'], row.lhs);
        row.chain.forEach((tex, k) => {
          add(i, ['rows', r, 'chain', k], tex);
        });
      });
    }
    if (b.kind === 'table') {
      b.rows.forEach((row, r) => {
        row.cells.forEach((cell, k) => {
          add(i, ['rows', r, 'cells', k], cell);
        });
      });
    }
  });
  return slips;
}

/** Places of digits that belong to printed numbers with decimals. */
function digitsOf(text: string): number[] {
  const places: number[] = [];
  for (const match of text.matchAll(/(?<![\w.{^])\d(?:\d|\{,\}(?=\d{3})|\\,(?=\d{3}))*\.\d+/g)) {
    for (let k = 0; k < match[0].length; k++) {
      const at = (match.index ?? 0) + k;
      if (/\d/.test(text[at] ?? '')) places.push(at);
    }
  }
  return places;
}

/** The document with that digit changed by three. */
export function withSlip(blocks: readonly Block[], slip: Slip): Block[] {
  const copy = structuredClone(blocks) as Block[];
  let owner: unknown = copy[slip.block];
  for (const key of slip.path.slice(0, -1)) owner = (owner as Record<string | number, unknown>)[key];
  const last = slip.path.at(-1) ?? '';
  const texts = owner as Record<string | number, string>;
  const text = texts[last] ?? '';
  const digit = (Number(text[slip.at]) + 3) % 10;
  texts[last] = `${text.slice(0, slip.at)}${digit}${text.slice(slip.at + 1)}`;
  return copy;
}

/** The same places on every run: a multiplicative congruential sequence (Lehmer 1951; Park and Miller 1988, a = 48271). */
export function pick<T>(list: readonly T[], count: number, seed = 20_251): T[] {
  let state = seed;
  return Array.from({ length: count }, () => {
    state = (state * 48_271) % 2_147_483_647;
    return list[state % list.length] as T;
  });
}
