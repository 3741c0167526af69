import { Canvas, Document, Page } from '@react-pdf/renderer';
import type { PageGeometry } from './page-geometry';
import type { PrintedDocument, PrintedPage } from './printed-page';

type Props = {
  readonly document: PrintedDocument;
  readonly geometry: PageGeometry;
  /** Draws a page's ink; called when the file is written, page by page. */
  readonly paint: (page: PrintedPage, index: number) => void;
};

/** A printed document: one page element a page, one canvas in each, since every place on it is already known. */
export function PaperDocument({ document, geometry, paint }: Props) {
  const { width, height } = geometry;
  return (
    <Document
      title={document.title}
      author={document.author}
      subject={document.subject}
      language={document.language}
    >
      {document.pages.map((page, index) => (
        <Page key={page.label} size={[width, height]}>
          <Canvas
            // A point short of the page, or rounding makes the layout try to break it. A canvas does not clip.
            style={{ position: 'absolute', left: 0, top: 0, width, height: height - 1 }}
            paint={() => {
              paint(page, index);
              return null;
            }}
          />
        </Page>
      ))}
    </Document>
  );
}
