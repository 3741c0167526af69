import type { FieldReader } from './field-reader';

/**
 * A row of sizes as the trade writes it: "20 ft; 24 ft" or "3 @ 24 ft" for three of the same, bay by bay or storey by
 * storey. Answers each size as it was typed; undefined after a sentence was noted at the field.
 */
export function readSizes(
  fields: FieldReader,
  path: string,
  text: string,
  noun: string,
  most: number,
): string[] | undefined {
  const parts = text.split(/\s*;\s*|,\s+/).filter((part) => part !== '');
  if (parts.length === 0) return fields.refuse(path, `${noun} are missing, such as ${example(fields)}.`);
  const sizes: string[] = [];
  for (const part of parts) {
    const [, count, each] = /^(\d+)\s*@\s*(.+)$/.exec(part) ?? [undefined, '1', part];
    const times = Number(count);
    if (fields.positive(path, each as string, 'length', 'Each of them') === undefined) return undefined;
    if (times < 1 || sizes.length + times > most)
      return fields.refuse(path, `At most ${most} can be laid out here.`);
    for (let i = 0; i < times; i++) sizes.push(each as string);
  }
  return sizes;
}

const example = ({ units }: FieldReader) => (units === 'US' ? '2 @ 24\'-0"; 18\'-6"' : '2 @ 7.2 m; 6 m');

/** Each place along a row of sizes, from nothing on, written as the sum of what was typed: "0", "(20 ft)", "(20 ft) + (24 ft)". */
export function placesAlong(sizes: readonly string[]): string[] {
  const places = ['0'];
  let run: { size: string; count: number }[] = [];
  for (const size of sizes) {
    const last = run.at(-1);
    run =
      last?.size === size
        ? [...run.slice(0, -1), { size, count: last.count + 1 }]
        : [...run, { size, count: 1 }];
    places.push(run.map((r) => (r.count === 1 ? `(${r.size})` : `${r.count}*(${r.size})`)).join(' + '));
  }
  return places;
}
