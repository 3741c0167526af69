/** A joint's or member's name as TeX: one letter italic, as a point of a drawing; anything longer upright. */
export function nameInTex(id: string): string {
  const safe = id.replace(/[\\{}$&#%_^~]/g, (c) =>
    c === '\\' ? '\\backslash ' : c === '~' || c === '^' ? '' : `\\${c}`,
  );
  return /^[A-Za-z]'?$/.test(id) || /^\d+$/.test(id) ? safe : `\\mathrm{${safe.replace(/–/g, '\\text{–}')}}`;
}
