export function print(line = ''): void {
  process.stdout.write(`${line}\n`);
}

export function table(head: readonly string[], rows: readonly (readonly string[])[]): void {
  const width = head.map((h, i) => Math.max(h.length, ...rows.map((r) => (r[i] ?? '').length)));
  const line = (cells: readonly string[]) =>
    print(cells.map((c, i) => c.padStart(width[i] as number)).join('  '));
  line(head);
  line(width.map((w) => '-'.repeat(w)));
  for (const row of rows) line(row);
  print();
}

/** Three significant figures. */
export const figures = (v: number) => (v === 0 ? '0' : v.toPrecision(3));
