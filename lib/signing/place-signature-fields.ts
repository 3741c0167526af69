// server only
import { PDFArray, PDFDict, PDFHexString, PDFName, PDFNumber, type PDFPage, PDFRef } from '@cantoo/pdf-lib';
import type { Bytes } from './bytes';
import { type Box, placeOnPage } from './place-on-page';
import { openForUpdate, saveUpdate } from './update-pdf';

export interface FieldPlace {
  /** The field's own name, one for each signer of the file: "engineer-of-record", "reviewer". */
  readonly field: string;
  /** Page index, from 0. */
  readonly page: number;
  readonly box: Box;
  /** What a screen reader says of it. */
  readonly label: string;
}

/** Print and Locked (ISO 32000-2, 12.5.3). */
const flags = 4 | 128;
/** A signature exists, and the file may only be appended to (ISO 32000-2, 12.7.3). */
const signatureFlags = 3;

/** pdf-lib's own addAnnot rewrites the page's content, which a reader shows as a changed page; this touches only Annots. */
function addAnnotation(page: PDFPage, ref: PDFRef): void {
  const key = PDFName.of('Annots');
  const raw = page.node.get(key);
  const list = page.node.lookupMaybe(key, PDFArray);
  if (!list) {
    page.node.set(key, page.doc.context.obj([ref]));
    return;
  }
  list.push(ref);
  page.doc.context.snapshot?.markRefForSave(raw instanceof PDFRef ? raw : page.ref);
}

/**
 * Appends empty signature fields. All of a file's fields are placed before its first signature: a later signature then only
 * fills one, and any other change shows. Throws when a place does not fit or the file has a form of another kind.
 */
export async function placeSignatureFields(pdf: Uint8Array, places: readonly FieldPlace[]): Promise<Bytes> {
  const document = await openForUpdate(pdf);
  const { context, catalog } = document;
  const refs = places.map(({ field, page: index, box, label }) => {
    const page = document.getPage(index);
    const { rect } = placeOnPage(page, box);
    const form = { Type: 'XObject', Subtype: 'Form', BBox: [0, 0, box[2], box[3]], Resources: {} };
    const ref = context.register(
      context.obj({
        Type: 'Annot',
        Subtype: 'Widget',
        FT: 'Sig',
        Rect: rect,
        T: PDFHexString.fromText(field),
        TU: PDFHexString.fromText(label),
        F: flags,
        P: page.ref,
        AP: { N: context.register(context.flateStream('', form)) },
      }),
    );
    addAnnotation(page, ref);
    return ref;
  });
  const key = PDFName.of('AcroForm');
  if (catalog.lookupMaybe(key, PDFDict)) throw new Error('the file has a form already');
  catalog.set(key, context.register(context.obj({ Fields: refs, SigFlags: PDFNumber.of(signatureFlags) })));
  return saveUpdate(document, pdf);
}
