// server only
import { NotUnderstood, PdfScanner } from './pdf-scanner';
import { PdfDict, PdfRef, type PdfValue, type Span } from './pdf-value';
import type { Entry, PdfFile } from './read-pdf';

interface Place {
  readonly offset: number;
  readonly gen: number;
  /** The object must end before the table of the revision that lists it. */
  readonly limit: number;
}

/** The objects of a file as they stood after revision `upTo` (0 is the oldest). */
export class PdfDocument {
  readonly trailer: PdfDict;
  readonly places = new Map<number, Place | null>();
  private readonly reading = new Set<string>();
  private readonly read = new Map<string, { value: PdfValue; span: Span }>();

  constructor(
    readonly file: PdfFile,
    readonly upTo: number,
  ) {
    const last = file.revisions[upTo];
    if (!last) throw new RangeError(`no revision ${upTo}`);
    this.trailer = last.trailer;
    for (const { entries, table } of file.revisions.slice(0, upTo + 1)) {
      for (const [num, entry] of entries) this.places.set(num, this.place(entry, table));
    }
  }

  /** The object a reference leads to, and its bytes; undefined when it leads nowhere. */
  object(ref: PdfRef): { value: PdfValue; span: Span } | undefined {
    const place = this.places.get(ref.num);
    if (!place || place.gen !== ref.gen) return undefined;
    const known = this.read.get(ref.key);
    if (known) return known;
    if (this.reading.has(ref.key)) throw new NotUnderstood('a stream length that leads round in a circle');
    this.reading.add(ref.key);
    const scan = new PdfScanner(this.file.bytes, place.offset, place.limit, (length) => {
      const value = this.object(length)?.value;
      if (typeof value !== 'number') throw new NotUnderstood('stream length');
      return value;
    });
    const object = scan.object(ref.num, ref.gen);
    this.read.set(ref.key, object);
    this.reading.delete(ref.key);
    return object;
  }

  /** Every object there is. Throws NotUnderstood when one of them cannot be read. */
  *objects(): Generator<PdfValue> {
    for (const [num, place] of this.places) {
      if (place) yield this.object(new PdfRef(num, place.gen))?.value ?? null;
    }
  }

  /** A value with its reference followed; a reference to nowhere is null (ISO 32000-2, 7.3.10). */
  resolve(value: PdfValue | undefined): PdfValue {
    const found = value instanceof PdfRef ? (this.object(value)?.value ?? null) : (value ?? null);
    if (found instanceof PdfRef) throw new NotUnderstood('a reference to a reference');
    return found;
  }

  dict(value: PdfValue | undefined): PdfDict {
    const found = this.resolve(value);
    if (!(found instanceof PdfDict)) throw new NotUnderstood('expected a dictionary');
    return found;
  }

  list(value: PdfValue | undefined): readonly PdfValue[] {
    const found = this.resolve(value);
    if (found === null) return [];
    if (!Array.isArray(found)) throw new NotUnderstood('expected an array');
    return found;
  }

  get catalog(): PdfDict {
    return this.dict(this.trailer.get('Root'));
  }

  private place(entry: Entry, limit: number): Place | null {
    return entry && { ...entry, limit };
  }
}
