import { type Combination, longestName } from './analysis';
import type { Draft } from './draft';
import type { FieldReader } from './field-reader';
import { freeName } from './free-name';

/** "1.2 D + 1.6 L − 0.5 W" as factors per case; every name must be a case of the sheet. */
export function readFactors(sum: string, cases: ReadonlySet<string>): Record<string, number> | string {
  const factors: Record<string, number> = {};
  const plain = sum.replace(/[−–]/g, '-').replace(/[×·*]/g, ' ').trim();
  if (plain === '') return 'A combination is missing, such as 1.2 D + 1.6 L.';
  const term = /\s*([+-]?)\s*(\d+(?:\.\d+)?|\.\d+)?\s*([A-Za-z]\w*)\s*/y;
  while (term.lastIndex < plain.length) {
    const start = term.lastIndex;
    const found = term.exec(plain);
    if (!found || (start > 0 && found[1] === '')) {
      return 'Write a combination as a sum of cases, such as 1.2 D + 1.6 L.';
    }
    const id = found[3] ?? '';
    if (!cases.has(id)) return `There is no case ${id} on this sheet.`;
    if (id in factors) return `Case ${id} stands twice in this sum.`;
    factors[id] = (found[1] === '-' ? -1 : 1) * Number(found[2] ?? '1');
  }
  return factors;
}

export function readCombinations(reader: FieldReader, draft: Draft): Combination[] {
  const cases = new Set(draft.cases.map((c) => c.id));
  const typed = draft.combinations.map((row) => row.id.trim());
  const taken = new Set(typed);
  return draft.combinations.flatMap((row, i) => {
    const factors = readFactors(row.sum, cases);
    if (typeof factors === 'string') {
      reader.refuse(`combinations.${i}.sum`, factors);
      return [];
    }
    const own = typed[i] ?? '';
    if (own !== '' && typed.indexOf(own) < i) {
      reader.refuse(
        `combinations.${i}.id`,
        `There are two combinations ${own}. Give each a name of its own.`,
      );
      return [];
    }
    const id = own === '' ? freeName(row.sum.trim(), taken, longestName) : own;
    taken.add(id);
    return [{ id, purpose: row.purpose, factors, source: row.source.trim() === '' ? undefined : row.source }];
  });
}
