export type PdfChangeKind =
  | 'page-drawn-over'
  | 'page-altered'
  | 'pages-added'
  | 'pages-removed'
  | 'pages-exchanged'
  | 'annotation'
  | 'field'
  | 'seal-appearance'
  | 'catalog'
  | 'information'
  | 'object'
  | 'object-removed'
  | 'empty-update';

const sentences: Record<PdfChangeKind, string> = {
  'page-drawn-over': 'What is drawn on a page was changed.',
  'page-altered': 'The size, turn or fonts of a page were changed.',
  'pages-added': 'Pages were added.',
  'pages-removed': 'Pages were removed.',
  'pages-exchanged': 'Pages were exchanged or reordered.',
  annotation: 'A note, mark or link on a page was added or changed.',
  field: 'A field of the form was added or changed.',
  'seal-appearance': 'The picture of a seal is not plain drawing.',
  catalog: 'The file was changed as a whole: its form, scripts, attachments or bookmarks.',
  information: 'Title, author or dates of the file were changed.',
  object: 'A part of the file was added or replaced.',
  'object-removed': 'A part of the file was removed.',
  'empty-update': 'The file was saved again after signing, without a signature.',
};

/** Something done to a file after it was first signed that is not a signature in a placed field. */
export interface PdfChange {
  readonly kind: PdfChangeKind;
  /** Counted from 1, as readers count; absent where it is not about one page. */
  readonly page?: number;
  readonly sentence: string;
  /** Which update did it: its place among the file's revisions, from 0. */
  readonly revision: number;
}

export function describeChange(kind: PdfChangeKind, revision: number, page?: number): PdfChange {
  return { kind, revision, sentence: sentences[kind], ...(page === undefined ? {} : { page }) };
}
