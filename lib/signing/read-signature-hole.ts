// server only
import type { Bytes } from './bytes';
import type { PdfDocument } from './pdf-document';
import { PdfDict, PdfName, PdfRef, PdfString } from './pdf-value';
import type { SignatureField } from './read-signature-fields';
import { SignatureRefusal } from './signature-refusal';
import { type Hole, signedPart } from './signed-part';

export interface FoundSignature {
  readonly cms: Bytes;
  /** Exactly the bytes it signs. */
  readonly content: Bytes;
  readonly hole: Hole;
  /** /SubFilter, the kind of signature. */
  readonly kind: string;
  /** What the signature dictionary says; only the signature itself proves anything. */
  readonly reason?: string;
}

function refuse(detail: string): never {
  throw new SignatureRefusal('byte-range', detail);
}

/** The one DER structure at the start of the hole; all after it must be zero. */
function takeCms(digits: string): Bytes {
  // One case only, so that a signed file has one spelling.
  if (!/^([0-9a-f]{2}){4,}$/.test(digits) && !/^([0-9A-F]{2}){4,}$/.test(digits)) refuse('not hexadecimal');
  const raw = new Uint8Array(Buffer.from(digits, 'hex'));
  const sizeOfLength = (raw[1] as number) & 0x7f;
  if (raw[0] !== 0x30 || !((raw[1] as number) & 0x80) || sizeOfLength < 1 || sizeOfLength > 4)
    refuse('length');
  const length = Buffer.from(raw).readUIntBE(2, sizeOfLength) + 2 + sizeOfLength;
  if (length > raw.length || raw.subarray(length).some((byte) => byte !== 0)) refuse('padding');
  return raw.subarray(0, length);
}

/**
 * The signature of a field, as it was made in the last revision of `document`: its ByteRange must leave out exactly its own
 * Contents and reach the end of that revision (ISO 32000-2, 12.8.1). Throws SignatureRefusal.
 */
export function readSignatureHole(document: PdfDocument, field: SignatureField): FoundSignature {
  const ref = field.dict.get('V');
  const object = ref instanceof PdfRef ? document.object(ref) : undefined;
  if (!object || !(object.value instanceof PdfDict)) refuse('no signature dictionary');
  const signature = object.value;
  const range = signature.get('ByteRange');
  const place = signature.places.get('Contents');
  if (!Array.isArray(range) || range.length !== 4 || !place) refuse('form');
  const [zero, before, after, rest] = range as unknown[];
  if (zero !== 0 || before !== place.from || after !== place.to || typeof rest !== 'number') {
    refuse('does not leave out exactly the signature');
  }
  const { bytes, revisions } = document.file;
  const { mark, to } = revisions[document.upTo] as { mark: number; to: number };
  const end = place.to + rest;
  // Line ends between a revision and the next may stand on either side; at the end of the file nothing is left out.
  if (end !== to && (end !== mark || to === bytes.length)) refuse(`ends at ${end}, its revision at ${to}`);
  if (bytes[place.from] !== 0x3c) refuse('contents');
  const kind = signature.get('SubFilter');
  const reason = signature.get('Reason');
  return {
    cms: takeCms(bytes.toString('latin1', place.from + 1, place.to - 1)),
    content: signedPart(bytes.subarray(0, end), place),
    hole: place,
    kind: kind instanceof PdfName ? kind.text : '',
    ...(reason instanceof PdfString ? { reason: reason.text } : {}),
  };
}
