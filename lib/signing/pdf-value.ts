// server only
/** The values a PDF is made of (ISO 32000-2, 7.3), as the strict reader returns them. */
export type PdfValue =
  | number
  | boolean
  | null
  | PdfName
  | PdfString
  | PdfRef
  | PdfDict
  | PdfStream
  | readonly PdfValue[];

export class PdfName {
  constructor(readonly text: string) {}
}

/** A string, as lower-case hexadecimal digits of its bytes. */
export class PdfString {
  constructor(readonly hex: string) {}

  /** The text a string stands for: UTF-16 with its mark, otherwise one byte a character. */
  get text(): string {
    const bytes = Buffer.from(this.hex, 'hex');
    if (bytes[0] !== 0xfe || bytes[1] !== 0xff || bytes.length % 2 !== 0) return bytes.toString('latin1');
    return Buffer.from(bytes.subarray(2)).swap16().toString('utf16le');
  }
}

export class PdfRef {
  constructor(
    readonly num: number,
    readonly gen: number,
  ) {}

  get key(): string {
    return `${this.num} ${this.gen}`;
  }
}

export interface Span {
  readonly from: number;
  readonly to: number;
}

export class PdfDict {
  readonly entries = new Map<string, PdfValue>();
  /** Where in the file the value of each key stands. */
  readonly places = new Map<string, Span>();

  get(key: string): PdfValue | undefined {
    return this.entries.get(key);
  }

  has(key: string): boolean {
    return this.entries.has(key);
  }
}

/** A stream: its dictionary, and where its bytes stand in the file. */
export class PdfStream {
  constructor(
    readonly dict: PdfDict,
    readonly data: Span,
  ) {}
}

/** The dictionary of a dictionary or a stream. */
export function dictOf(value: PdfValue | undefined): PdfDict | undefined {
  if (value instanceof PdfStream) return value.dict;
  return value instanceof PdfDict ? value : undefined;
}

export function isName(value: PdfValue | undefined, text: string): boolean {
  return value instanceof PdfName && value.text === text;
}

/** Whether two values say the same; references are compared, not followed. */
export function sameValue(a: PdfValue | undefined, b: PdfValue | undefined): boolean {
  if (Array.isArray(a) && Array.isArray(b)) {
    return a.length === b.length && a.every((value, i) => sameValue(value, b[i]));
  }
  if (a instanceof PdfDict && b instanceof PdfDict) return changedKeys(a, b).length === 0;
  if (a instanceof PdfName && b instanceof PdfName) return a.text === b.text;
  if (a instanceof PdfString && b instanceof PdfString) return a.hex === b.hex;
  if (a instanceof PdfRef && b instanceof PdfRef) return a.key === b.key;
  return a === b;
}

/** Keys whose values differ between two dictionaries, or that only one of them has. */
export function changedKeys(a: PdfDict, b: PdfDict): string[] {
  return [...new Set([...a.entries.keys(), ...b.entries.keys()])].filter(
    (key) => !sameValue(a.get(key), b.get(key)),
  );
}

/** Every reference inside a value. */
export function* refsIn(value: PdfValue | undefined): Generator<PdfRef> {
  if (value instanceof PdfRef) yield value;
  else if (Array.isArray(value)) for (const one of value) yield* refsIn(one);
  else for (const one of dictOf(value as PdfValue)?.entries.values() ?? []) yield* refsIn(one);
}
