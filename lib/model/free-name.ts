/** A name of at most `longest` characters that is not taken: the one that is wanted, or with (2), (3) … behind it. */
export function freeName(wanted: string, taken: ReadonlySet<string>, longest: number): string {
  let name = wanted.slice(0, longest);
  for (let n = 2; taken.has(name); n++) {
    const mark = ` (${n})`;
    name = `${wanted.slice(0, longest - mark.length)}${mark}`;
  }
  return name;
}
