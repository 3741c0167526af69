// server only
import type { PdfDocument } from './pdf-document';
import { NotUnderstood } from './pdf-scanner';
import { isName, type PdfDict, PdfRef, PdfString, type PdfValue } from './pdf-value';

export interface SignatureField {
  readonly ref: PdfRef;
  readonly dict: PdfDict;
  readonly name: string;
  readonly signed: boolean;
}

/** The signature fields of a form, in order. A form of nested fields is not one the office writes, and is refused. */
export function readSignatureFields(document: PdfDocument): SignatureField[] {
  const { catalog } = document;
  if (!catalog.has('AcroForm')) return [];
  const list = document.list(document.dict(catalog.get('AcroForm')).get('Fields'));
  const seen = new Set<string>();
  return list.flatMap((ref: PdfValue) => {
    if (!(ref instanceof PdfRef) || seen.has(ref.key)) throw new NotUnderstood('form field');
    seen.add(ref.key);
    const dict = document.dict(ref);
    if (dict.has('Kids') || dict.has('Parent')) throw new NotUnderstood('nested form fields');
    if (!isName(dict.get('FT'), 'Sig')) return [];
    const name = dict.get('T');
    if (!(name instanceof PdfString)) throw new NotUnderstood('a field without a name');
    return [{ ref, dict, name: name.text, signed: dict.has('V') }];
  });
}
