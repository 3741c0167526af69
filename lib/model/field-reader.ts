import type { KindName, UnitSetName } from '@/lib/units/kind';
import { readQuantity } from '@/lib/units/read-quantity';

/** What is wrong, in a sentence, at which field of the draft ("geometry.spans.1.length"). */
export interface FieldError {
  path: string;
  message: string;
}

/** Reads the text fields of a draft one by one and gathers what cannot be read, so that every field gets its sentence. */
export class FieldReader {
  readonly errors: FieldError[] = [];

  constructor(readonly units: UnitSetName) {}

  refuse(path: string, message: string): undefined {
    this.errors.push({ path, message });
    return undefined;
  }

  /** The value in coherent units; undefined after an error was noted. `L` may be used for a length given. */
  read(path: string, text: string, kind: KindName, L?: number): number | undefined {
    const span = { kind: 'length' as const };
    const reading = readQuantity(text, kind, this.units, L === undefined ? {} : { L: { value: L, ...span } });
    return reading.ok ? reading.value : this.refuse(path, reading.message);
  }

  positive(path: string, text: string, kind: KindName, noun: string): number | undefined {
    const value = this.read(path, text, kind);
    if (value !== undefined && value <= 0) return this.refuse(path, `${noun} must be greater than zero.`);
    return value;
  }

  /** Blank is allowed and is undefined. */
  optional(path: string, text: string, kind: KindName, noun: string): number | undefined {
    return text.trim() === '' ? undefined : this.positive(path, text, kind, noun);
  }
}
