// server only
import type { Knex } from 'knex';
import { type RevisionLine, revisionsOfSubmittal } from '@/db/queries/revisions';
import { type SubmittalRow, submittalsOf } from '@/db/queries/submittals';

export interface Changes {
  /** Number of the last submittal that was sent before this one; undefined for the first. */
  since: number | undefined;
  /** By revision id: not in that submittal, in it with another revision, or the same. */
  of: Map<string, 'new' | 'changed' | 'same'>;
  /** Sheets of that submittal that this one leaves out. */
  leftOut: RevisionLine[];
}

/** How the sheets of a submittal stand to the last one of the job that was sent before it. */
export async function changesSince(
  db: Knex,
  submittal: Pick<SubmittalRow, 'office_id' | 'job_id' | 'number'>,
  revisions: readonly RevisionLine[],
): Promise<Changes> {
  const all = await submittalsOf(db, submittal.office_id, submittal.job_id);
  const last = all.findLast(
    (s) => s.number < submittal.number && (s.state === 'sent' || s.state === 'decided'),
  );
  if (!last) return { since: undefined, of: new Map(revisions.map((r) => [r.id, 'new'])), leftOut: [] };
  const before = await revisionsOfSubmittal(db, submittal.office_id, last.id);
  const stand = (r: RevisionLine) => {
    const earlier = before.find((b) => b.sheet_id === r.sheet_id);
    if (!earlier) return 'new';
    return earlier.id === r.id ? 'same' : 'changed';
  };
  return {
    since: last.number,
    of: new Map(revisions.map((r) => [r.id, stand(r)])),
    leftOut: before.filter((b) => !revisions.some((r) => r.sheet_id === b.sheet_id)),
  };
}

/** What a changed sheet is flagged with in a list; nothing for one that is the same, or in a first submittal. */
export function sayChange(changes: Changes, revisionId: string): string {
  const how = changes.of.get(revisionId);
  if (changes.since === undefined || how === undefined || how === 'same') return '';
  return how === 'new' ? `new since submittal ${changes.since}` : `changed since submittal ${changes.since}`;
}
