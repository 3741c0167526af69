/** Rows as comma-separated values (RFC 4180), so that any spreadsheet reads them; the first row is the head. */
export function csv(rows: readonly (readonly (string | number | null | undefined)[])[]): string {
  return `${rows.map((row) => row.map(cell).join(',')).join('\r\n')}\r\n`;
}

/** A cell that a spreadsheet would take for a formula gets an apostrophe, so that opening the file runs nothing. */
function cell(value: string | number | null | undefined): string {
  const text = value === null || value === undefined ? '' : String(value);
  const safe = typeof value === 'string' && /^[=+@\t\r]|^-[^\d]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
