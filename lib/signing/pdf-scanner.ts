// server only
import { PdfDict, PdfName, PdfRef, PdfStream, PdfString, type PdfValue, type Span } from './pdf-value';

/** The file is damaged, or uses something this reader does not know; either way nothing is concluded from it. */
export class NotUnderstood extends Error {}

const blanks = new Set([0, 9, 10, 12, 13, 32]);
const delimiters = new Set([...'()<>[]{}/%'].map((character) => character.charCodeAt(0)));
const escapes: Record<string, number> = { n: 10, r: 13, t: 9, b: 8, f: 12 };
const deepest = 60;

/**
 * Reads PDF values at exact places, refusing whatever the office's own files never contain: comments inside objects,
 * doubled keys, odd numbers. Two readers must not be able to see two things in one file.
 */
export class PdfScanner {
  private depth = 0;

  constructor(
    readonly bytes: Buffer,
    public at: number,
    readonly end: number,
    private readonly lengthOf?: (ref: PdfRef) => number,
  ) {}

  fail(what: string): never {
    throw new NotUnderstood(`${what} at byte ${this.at}`);
  }

  sees(text: string): boolean {
    return this.bytes.toString('latin1', this.at, Math.min(this.at + text.length, this.end)) === text;
  }

  take(text: string): this {
    if (!this.sees(text)) this.fail(`expected ${text}`);
    this.at += text.length;
    return this;
  }

  blank(): this {
    while (this.at < this.end && blanks.has(this.byte())) this.at++;
    return this;
  }

  integer(): number {
    const word = this.blank().word();
    if (!/^\d{1,10}$/.test(word)) this.fail('expected a whole number');
    return Number(word);
  }

  value(): PdfValue {
    if (++this.depth > deepest) this.fail('nesting');
    this.blank();
    const value = this.one();
    this.depth--;
    return value;
  }

  dict(): PdfDict {
    const dict = new PdfDict();
    this.take('<<');
    for (;;) {
      if (this.blank().sees('>>')) {
        this.at += 2;
        return dict;
      }
      const key = this.value();
      if (!(key instanceof PdfName) || dict.has(key.text)) this.fail('dictionary key');
      const from = this.blank().at;
      dict.entries.set(key.text, this.value());
      dict.places.set(key.text, { from, to: this.at });
    }
  }

  /** `num gen obj … endobj`, at exactly this place. */
  object(num: number, gen: number): { value: PdfValue; span: Span } {
    const from = this.at;
    this.take(`${num} ${gen} obj`);
    let value = this.value();
    if (value instanceof PdfDict && this.blank().sees('stream')) value = this.stream(value);
    this.blank().take('endobj');
    return { value, span: { from, to: this.at } };
  }

  private byte(): number {
    return this.bytes[this.at] ?? this.fail('end');
  }

  private word(): string {
    const from = this.at;
    while (this.at < this.end && !blanks.has(this.byte()) && !delimiters.has(this.byte())) this.at++;
    return this.bytes.toString('latin1', from, this.at);
  }

  private one(): PdfValue {
    if (this.sees('<<')) return this.dict();
    if (this.sees('<')) return this.hex();
    if (this.sees('(')) return this.literal();
    if (this.sees('[')) return this.array();
    if (this.sees('/')) return this.name();
    const word = this.word();
    if (word === 'true' || word === 'false') return word === 'true';
    if (word === 'null') return null;
    if (/^\d{1,10}$/.test(word)) return this.reference(Number(word));
    if (/^[+-]?(\d+\.?\d*|\.\d+)$/.test(word)) return Number(word);
    return this.fail('token');
  }

  private name(): PdfName {
    this.at++;
    const text = this.word();
    return new PdfName(
      text.replace(/#([0-9a-fA-F]{2})/g, (_, digits) => String.fromCharCode(parseInt(digits, 16))),
    );
  }

  private array(): PdfValue[] {
    const list: PdfValue[] = [];
    this.at++;
    while (!this.blank().sees(']')) list.push(this.value());
    this.at++;
    return list;
  }

  private reference(num: number): PdfValue {
    const rest = this.bytes.toString('latin1', this.at, Math.min(this.at + 24, this.end));
    const match = /^[\0\t\n\f\r ]+(\d{1,5})[\0\t\n\f\r ]+R(?![^\0\t\n\f\r ()<>[\]{}/%])/.exec(rest);
    if (!match) return num;
    this.at += match[0].length;
    return new PdfRef(num, Number(match[1]));
  }

  private hex(): PdfString {
    const from = ++this.at;
    const to = this.bytes.indexOf(0x3e, from);
    if (to < 0 || to >= this.end) this.fail('string');
    const digits = this.bytes.toString('latin1', from, to).replace(/[\0\t\n\f\r ]/g, '');
    if (!/^[0-9a-fA-F]*$/.test(digits)) this.fail('hexadecimal string');
    this.at = to + 1;
    return new PdfString((digits.length % 2 === 0 ? digits : `${digits}0`).toLowerCase());
  }

  private literal(): PdfString {
    const out: number[] = [];
    let open = 0;
    this.at++;
    for (;;) {
      if (this.at >= this.end) this.fail('string');
      const byte = this.byte();
      this.at++;
      if (byte === 0x5c) {
        out.push(...this.escape());
        continue;
      }
      if (byte === 0x28) open++;
      if (byte === 0x29 && --open < 0) return new PdfString(Buffer.from(out).toString('hex'));
      out.push(byte);
    }
  }

  private escape(): number[] {
    const octal = /^[0-7]{1,3}/.exec(this.bytes.toString('latin1', this.at, Math.min(this.at + 3, this.end)));
    if (octal) {
      this.at += octal[0].length;
      return [parseInt(octal[0], 8) & 255];
    }
    const byte = this.byte();
    this.at++;
    if (byte === 13 && this.sees('\n')) this.at++;
    // A line end after a backslash is left out; before any other character the backslash is (ISO 32000-2, 7.3.4.2).
    return byte === 13 || byte === 10 ? [] : [escapes[String.fromCharCode(byte)] ?? byte];
  }

  private stream(dict: PdfDict): PdfStream {
    this.take('stream');
    this.take(this.sees('\r\n') ? '\r\n' : '\n');
    const stated = dict.get('Length');
    const length = stated instanceof PdfRef ? this.lengthOf?.(stated) : stated;
    if (typeof length !== 'number' || !Number.isInteger(length) || length < 0) this.fail('stream length');
    const data = { from: this.at, to: this.at + length };
    if (data.to > this.end) this.fail('stream length');
    this.at = data.to;
    this.blank().take('endstream');
    return new PdfStream(dict, data);
  }
}
