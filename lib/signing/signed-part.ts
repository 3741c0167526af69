import { type Bytes, concat } from './bytes';

/** The gap left for a signature: byte `from` is its `<`, byte `to` is the first after its `>`. */
export interface Hole {
  readonly from: number;
  readonly to: number;
}

/** What a PDF signature covers: the whole file but the gap the signature itself stands in (ISO 32000-2, 12.8.1). */
export function signedPart(pdf: Uint8Array, hole: Hole): Bytes {
  return concat([pdf.subarray(0, hole.from), pdf.subarray(hole.to)]);
}
