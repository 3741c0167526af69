// server only
import { PdfDocument } from './pdf-document';
import { NotUnderstood } from './pdf-scanner';
import { PdfRef, PdfStream, refsIn, type Span, sameValue } from './pdf-value';
import type { PdfFile, Revision } from './read-pdf';

/** What an update did, object by object. Objects rewritten to say the same are left out. */
export interface Update {
  readonly before: PdfDocument;
  readonly after: PdfDocument;
  /** Objects there were none of before. */
  readonly fresh: ReadonlyMap<string, PdfRef>;
  readonly changed: ReadonlyMap<string, PdfRef>;
  readonly removed: number;
  /** Some fresh object stands where an earlier reference led nowhere: it was put there for later. */
  readonly fillsEarlierReference: boolean;
}

/** The bytes of an update must be its objects, its table and blanks: nothing may hide between them. */
function checkTiling(file: PdfFile, revision: Revision, spans: Span[]): void {
  let at = revision.from;
  spans.sort((a, b) => a.from - b.from);
  for (const { from, to } of [...spans, { from: revision.table, to: revision.table }]) {
    if (from < at) throw new NotUnderstood('objects overlap');
    for (const byte of file.bytes.subarray(at, from)) {
      if (byte !== 10 && byte !== 13 && byte !== 32) throw new NotUnderstood('stray bytes in an update');
    }
    at = to;
  }
}

function earlierReferenceFilled(before: PdfDocument, fresh: Iterable<PdfRef>): boolean {
  const numbers = new Set([...fresh].map(({ num }) => num));
  for (const value of before.objects()) {
    for (const ref of refsIn(value)) if (numbers.has(ref.num)) return true;
  }
  return false;
}

/** Reads revision `index` (at least 1) against the one before it. Throws NotUnderstood. */
export function readUpdate(file: PdfFile, index: number): Update {
  const revision = file.revisions[index] as Revision;
  const before = new PdfDocument(file, index - 1);
  const after = new PdfDocument(file, index);
  const fresh = new Map<string, PdfRef>();
  const changed = new Map<string, PdfRef>();
  const spans: Span[] = [];
  let removed = 0;
  for (const [num, entry] of revision.entries) {
    const old = before.places.get(num);
    if (!entry) {
      if (old) removed++;
      continue;
    }
    if (entry.offset < revision.from || entry.offset >= revision.table)
      throw new NotUnderstood('an object elsewhere');
    if (old && old.gen !== entry.gen) throw new NotUnderstood('generation');
    const ref = new PdfRef(num, entry.gen);
    const object = after.object(ref);
    if (!object) throw new NotUnderstood('a listed object is missing');
    spans.push(object.span);
    if (!old) fresh.set(ref.key, ref);
    else if (object.value instanceof PdfStream || !sameValue(object.value, before.object(ref)?.value)) {
      changed.set(ref.key, ref);
    }
  }
  checkTiling(file, revision, spans);
  return {
    before,
    after,
    fresh,
    changed,
    removed,
    fillsEarlierReference: earlierReferenceFilled(before, fresh.values()),
  };
}
