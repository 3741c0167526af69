import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csv } from '@/lib/services/export/csv';

/** RFC 4180 read back by its grammar, apart from the writer. */
function read(text: string): string[][] {
  const rows: string[][] = [];
  const field = /(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/gy;
  let row: string[] = [];
  for (let m = field.exec(text); m; m = field.exec(text)) {
    row.push(m[1] === undefined ? (m[2] as string) : m[1].replaceAll('""', '"'));
    if (m[3] === '\r\n') {
      rows.push(row);
      row = [];
    }
  }
  return rows;
}

describe('comma-separated values', () => {
  it('come back as they were written, whatever is in them', () => {
    const harmless = fc.string().filter((s) => !/^[=+@\t\r]|^-[^\d]/.test(s));
    const table = fc.array(fc.array(harmless, { minLength: 2, maxLength: 5 }), {
      minLength: 1,
      maxLength: 8,
    });
    fc.assert(
      fc.property(table, (rows) => {
        expect(read(csv(rows))).toEqual(rows);
      }),
    );
  });

  it('run nothing in a spreadsheet', () => {
    expect(csv([['=1+1', '@now', '-cmd', '-12.5', 3, null]])).toBe("'=1+1,'@now,'-cmd,-12.5,3,\r\n");
  });
});
