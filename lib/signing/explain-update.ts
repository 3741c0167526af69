// server only
import { explainSigning } from './explain-signing';
import { describeChange, type PdfChange, type PdfChangeKind } from './pdf-change';
import type { PdfDocument } from './pdf-document';
import { changedKeys, PdfRef, type PdfValue, refsIn, sameValue } from './pdf-value';
import { readPageTree } from './read-page-tree';
import type { PdfFile } from './read-pdf';
import type { SignatureField } from './read-signature-fields';
import { readUpdate, type Update } from './read-update';

export interface ExplainedUpdate {
  /** The field it signs, if it signs one. */
  readonly field?: SignatureField;
  /** All it did beside that. Empty: it signed a placed field and nothing else. */
  readonly changes: readonly PdfChange[];
}

type Note = (kind: PdfChangeKind, page?: number) => void;

function listed(value: PdfValue | undefined, document: PdfDocument): PdfValue[] {
  const found = document.resolve(value);
  return [...(value instanceof PdfRef ? [value] : []), ...(Array.isArray(found) ? found : [])];
}

/** Says which page a change is on, where it is on one. Returns the objects it named. */
function explainPages({ before, after, changed }: Update, note: Note): Set<string> {
  const named = new Set<string>();
  const old = readPageTree(before);
  const now = readPageTree(after);
  if (now.length > old.length) note('pages-added');
  else if (now.length < old.length) note('pages-removed');
  else if (!sameValue(now, old)) note('pages-exchanged');
  for (const [i, ref] of now.entries()) {
    const page = after.dict(ref);
    if (changed.has(ref.key) && old.some(({ key }) => key === ref.key)) {
      named.add(ref.key);
      for (const key of changedKeys(before.dict(ref), page)) {
        note(
          key === 'Contents' ? 'page-drawn-over' : key === 'Annots' ? 'annotation' : 'page-altered',
          i + 1,
        );
      }
    }
    for (const [key, kind] of [
      ['Contents', 'page-drawn-over'],
      ['Annots', 'annotation'],
    ] as const) {
      for (const part of listed(page.get(key), after)) {
        if (!(part instanceof PdfRef) || !changed.has(part.key) || named.has(part.key)) continue;
        named.add(part.key);
        note(kind, i + 1);
      }
    }
  }
  return named;
}

/** Validation data (PAdES, /DSS) may be added: certificates and lists, which no page can show. */
function validationData({ before, after, fresh }: Update): Set<string> {
  const keys = changedKeys(before.catalog, after.catalog);
  const store = after.catalog.get('DSS');
  if (keys.length !== 1 || keys[0] !== 'DSS' || before.catalog.has('DSS') || store === undefined)
    return new Set();
  const reached = new Set<string>();
  const walk = (value: PdfValue | undefined) => {
    for (const ref of refsIn(value)) {
      if (!fresh.has(ref.key) || reached.has(ref.key)) continue;
      reached.add(ref.key);
      walk(after.object(ref)?.value);
    }
  };
  walk(store);
  const root = after.trailer.get('Root');
  if (root instanceof PdfRef) reached.add(root.key);
  return reached;
}

/**
 * Explains what revision `index` (at least 1) did to a file that was signed before it, object by object. It may fill one
 * placed field, or add validation data; all else is a change. Throws NotUnderstood.
 */
export function explainUpdate(file: PdfFile, index: number): ExplainedUpdate {
  const update = readUpdate(file, index);
  const changes = new Map<string, PdfChange>();
  const note: Note = (kind, page) => changes.set(`${kind} ${page}`, describeChange(kind, index, page));
  const { before, after } = update;
  const { field, accounted, wrong } = explainSigning(update);
  for (const kind of wrong) note(kind);
  if (update.removed > 0) note('object-removed');
  if (update.fillsEarlierReference) note('object');
  const evidence = validationData(update);
  const trailer = changedKeys(before.trailer, after.trailer);
  if (trailer.some((key) => !['Size', 'Prev', 'ID', 'Info'].includes(key))) note('catalog');
  if (trailer.includes('Info')) note('information');
  const named = explainPages({ ...update, changed: without(update.changed, accounted) }, note);
  const root = after.trailer.get('Root');
  const info = after.trailer.get('Info');
  const form = after.catalog.get('AcroForm');
  for (const [key, ref] of update.changed) {
    if (accounted.has(key) || named.has(key) || evidence.has(key)) continue;
    if (sameValue(ref, root)) note('catalog');
    else if (sameValue(ref, info)) note('information');
    else if (sameValue(ref, form)) note('field');
    else note('object');
  }
  const unasked = [...update.fresh.keys()].some((key) => !accounted.has(key) && !evidence.has(key));
  // A fresh object matters through whatever changed object leads to it; alone it is still not explained.
  if (unasked && changes.size === 0) note('object');
  if (!field && evidence.size === 0 && changes.size === 0) note('empty-update');
  return { ...(field ? { field } : {}), changes: [...changes.values()] };
}

function without(all: ReadonlyMap<string, PdfRef>, some: ReadonlySet<string>): Map<string, PdfRef> {
  return new Map([...all].filter(([key]) => !some.has(key)));
}
