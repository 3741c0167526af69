// server only
import layoutDocument from '@react-pdf/layout';
import renderPDF from '@react-pdf/render';
import { Font, pdf } from '@react-pdf/renderer';
import PDFDocument, { type PdfOutline } from 'pdfkit';
import { PaperDocument } from './document';
import { drawInk } from './draw-ink';
import { typesetter } from './faces';
import { pageGeometry } from './page-geometry';
import { PaperPen } from './paper-pen';
import type { PrintedDocument, PrintedPage } from './printed-page';

/**
 * Writes the PDF file of a document whose pages are set. The same document gives the same bytes.
 *
 * The steps are those of the renderer's own `pdf().toBuffer()`; they are taken one by one here because its canvas hides
 * the pdfkit document, and with it embedded glyphs, alternative text, links, page labels and associated files.
 */
export async function renderDocument(printed: PrintedDocument): Promise<Uint8Array> {
  const doc = new PaperFile({
    compress: true,
    pdfVersion: '1.7',
    lang: printed.language,
    displayTitle: true,
    autoFirstPage: false,
    font: null,
    info: {
      Title: printed.title,
      Author: printed.author,
      Subject: printed.subject,
      Creator: 'Fairhand',
      Producer: 'Fairhand',
      CreationDate: printed.date,
      ModDate: printed.date,
    },
  });
  const bytes = collect(doc);
  const pen = new PaperPen(doc, typesetter);
  const geometry = pageGeometry(printed.size);
  const outline = new Bookmarks(doc.outline, geometry.width);
  const paint = (page: PrintedPage, index: number) => {
    drawInk(page.ink, pen);
    for (const { name, y } of page.destinations) doc.addNamedDestination(name, 'XYZ', 0, y, null);
    for (const bookmark of page.bookmarks) outline.add(bookmark, index);
  };
  const root = await reconcile(PaperDocument({ document: printed, geometry, paint }));
  labelPages(doc, printed.pages);
  if (printed.data) {
    const { name, description, bytes: data } = printed.data;
    const dates = { creationDate: printed.date, modifiedDate: printed.date };
    doc.file(data, { name, description, type: 'application/json', relationship: 'Data', ...dates });
  }
  renderPDF(doc, await layoutDocument(root, Font));
  return bytes;
}

/** pdfkit copies `info` into the XMP packet as it stands; XML wants its three signs escaped. */
class PaperFile extends PDFDocument {
  override endMetadata(): void {
    const escaped = (value: string | Date | undefined) =>
      typeof value === 'string'
        ? value.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')
        : value;
    this.info = Object.fromEntries(Object.entries(this.info).map(([key, value]) => [key, escaped(value)]));
    super.endMetadata();
  }
}

function collect(doc: PDFDocument): Promise<Uint8Array> {
  const chunks: Uint8Array[] = [];
  return new Promise((resolve, reject) => {
    doc.on('data', (chunk) => chunks.push(chunk));
    doc.on('end', () => resolve(new Uint8Array(Buffer.concat(chunks))));
    doc.on('error', reject);
  });
}

/** The renderer's own tree of a document element; `container` is what its toBuffer reads, left out of its types. */
async function reconcile(element: ReturnType<typeof PaperDocument>): Promise<unknown> {
  const instance = pdf() as ReturnType<typeof pdf> & { container: { document: unknown } };
  await new Promise<void>((resolve) => instance.updateContainer(element, resolve));
  return instance.container.document;
}

/** Names of the pages in a reader's page list: a dictionary a page with its label as prefix (ISO 32000-1, 12.4.2). */
function labelPages(doc: PDFDocument, pages: readonly PrintedPage[]): void {
  const numbers = pages.flatMap(({ label }, index) => [index, { P: Object.assign(new String(label)) }]);
  doc._root.data.PageLabels = { Nums: numbers };
}

class Bookmarks {
  private section: PdfOutline | undefined;
  constructor(
    private readonly root: PdfOutline,
    private readonly pageWidth: number,
  ) {}

  add({ title, level, y }: PrintedPage['bookmarks'][number], pageNumber: number): void {
    const parent = level === 0 ? this.root : (this.section ?? this.root);
    // pdfkit takes `left` from the right edge of the page; its width leads to the left edge.
    const item = parent.addItem(title, { pageNumber, top: y, left: this.pageWidth });
    if (level === 0) this.section = item;
  }
}
