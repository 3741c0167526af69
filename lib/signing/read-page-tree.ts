// server only
import type { PdfDocument } from './pdf-document';
import { NotUnderstood } from './pdf-scanner';
import { isName, PdfRef } from './pdf-value';

const mostPages = 20_000;

/** References to the pages, in order. */
export function readPageTree(document: PdfDocument): PdfRef[] {
  const pages: PdfRef[] = [];
  const seen = new Set<string>();
  const walk = (node: unknown) => {
    if (!(node instanceof PdfRef) || seen.has(node.key) || pages.length > mostPages) {
      throw new NotUnderstood('page tree');
    }
    seen.add(node.key);
    const dict = document.dict(node);
    if (isName(dict.get('Type'), 'Pages')) document.list(dict.get('Kids')).forEach(walk);
    else pages.push(node);
  };
  walk(document.catalog.get('Pages'));
  return pages;
}
