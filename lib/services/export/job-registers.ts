// server only
import type { AuditRow } from '@/db/queries/audit';
import type { MarkRow } from '@/db/queries/checks';
import type { CommentLine } from '@/db/queries/reviews';
import type { RevisionLine } from '@/db/queries/revisions';
import { sheetName } from '../sheet-state';
import { csv } from './csv';

/** Every revision of the job with who made and who checked it. */
export function revisionRegister(revisions: readonly RevisionLine[]): string {
  return csv([
    [
      'sheet',
      'revision',
      'title',
      'reason',
      'originator',
      'frozen',
      'checker',
      'check',
      'checked',
      'engine',
      'sha256',
    ],
    ...revisions.map((r) => [
      sheetName(r.sheet_number),
      r.number,
      r.title,
      r.reason,
      r.originator_name,
      r.frozen_at.toISOString(),
      r.checker,
      r.check_state,
      r.checked_at?.toISOString(),
      r.engine,
      r.digest,
    ]),
  ]);
}

export function markRegister(marks: readonly { revision: RevisionLine; mark: MarkRow }[]): string {
  return csv([
    ['sheet', 'revision', 'line', 'kind', 'text', 'answer', 'at'],
    ...marks.map(({ revision, mark }) => [
      sheetName(revision.sheet_number),
      revision.number,
      mark.line,
      mark.kind,
      mark.text,
      mark.answer,
      mark.at.toISOString(),
    ]),
  ]);
}

export function commentRegister(comments: readonly (CommentLine & { submittal: number })[]): string {
  return csv([
    ['submittal', 'comment', 'line', 'code', 'text', 'author', 'at', 'state', 'answer', 'place'],
    ...comments.map((c) => [
      c.submittal,
      c.number,
      c.line,
      c.code,
      c.text,
      c.author,
      c.at.toISOString(),
      c.state,
      c.answer,
      c.place,
    ]),
  ]);
}

/** The record of the job, oldest first, with the hashes that bind each entry to the one before it in the office. */
export function recordRegister(entries: readonly AuditRow[]): string {
  return csv([
    ['at', 'person', 'verb', 'subject', 'digest', 'hash before', 'hash'],
    ...entries.map((e) => [e.at.toISOString(), e.person, e.verb, e.subject, e.digest, e.before_hash, e.hash]),
  ]);
}
