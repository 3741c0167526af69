// server only
import { PDFDocument } from '@cantoo/pdf-lib';
import type { PageGeometry } from './page-geometry';

/** Pages of an attached file, each on the page of the package that frames it (indexes from 0). */
export type Attached = { readonly file: Uint8Array; readonly firstPage: number };

/** The number of pages of an attached file. */
export async function countPages(file: Uint8Array): Promise<number> {
  const source = await PDFDocument.load(file, { throwOnInvalidObject: true, updateMetadata: false });
  return source.getPageCount();
}

/**
 * Draws attached pages inside the double rule of the pages made for them, as large as the text area allows. Only what
 * the pages show comes along: no scripts, forms or annotations. Written without object streams, so that a signature
 * can be added by a later update of any reader's kind.
 */
export async function frameAttached(
  bytes: Uint8Array,
  attached: readonly Attached[],
  geometry: PageGeometry,
): Promise<Uint8Array> {
  if (attached.length === 0) return bytes;
  const target = await PDFDocument.load(bytes, { updateMetadata: false });
  const room = { width: geometry.textWidth, height: geometry.bottom - geometry.top };
  for (const { file, firstPage } of attached) {
    const source = await PDFDocument.load(file, { throwOnInvalidObject: true, updateMetadata: false });
    // A blank page has no contents; its frame alone is its copy.
    const shown = [...source.getPages().entries()].filter(([, page]) => page.node.Contents());
    const embedded = await target.embedPages(shown.map(([, page]) => page));
    embedded.forEach((page, at) => {
      const scale = Math.min(1, room.width / page.width, room.height / page.height);
      const width = page.width * scale;
      const height = page.height * scale;
      const y = geometry.height - geometry.top - height;
      const index = firstPage + (shown[at]?.[0] ?? at);
      target.getPage(index).drawPage(page, { x: geometry.textLeft, y, width, height });
    });
  }
  return target.save({ useObjectStreams: false, updateFieldAppearances: false });
}
