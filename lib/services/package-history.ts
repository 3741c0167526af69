// server only
import type { Knex } from 'knex';
import { type RevisionLine, revisionsOfSheet, revisionsOfSubmittal } from '@/db/queries/revisions';
import { submittalsOf } from '@/db/queries/submittals';
import { blocks } from '@/templates/block';
import { lastChanged } from '@/templates/last-changed';

/** What came before a revision that goes out. */
export interface RevisionPast {
  /** The revision in which each line last changed, by line id. */
  changedIn: ReadonlyMap<string, number>;
  /** Against the newest submittal that went out before: a sheet it had not, or had in another revision. */
  since?: 'new' | 'changed';
  /** Every revision up to this one, the first first. */
  revisions: { number: number; frozenAt: Date; reason: string; originator: string }[];
}

/** The past of each revision of a package, in their order. */
export async function packageHistory(
  db: Knex,
  officeId: string,
  jobId: string,
  revisions: readonly RevisionLine[],
): Promise<RevisionPast[]> {
  const before = await lastSent(db, officeId, jobId);
  return Promise.all(
    revisions.map(async (r): Promise<RevisionPast> => {
      const all = await revisionsOfSheet(db, officeId, r.sheet_id);
      const past = all.filter((other) => other.number <= r.number).reverse();
      const sent = before?.get(r.sheet_id);
      const since =
        !before || sent === r.number ? {} : ({ since: sent === undefined ? 'new' : 'changed' } as const);
      return {
        ...since,
        changedIn: lastChanged(past.map((p) => ({ number: p.number, blocks: blocks.parse(p.blocks) }))),
        revisions: past.map((p) => ({
          number: p.number,
          frozenAt: p.frozen_at,
          reason: p.reason,
          originator: p.originator,
        })),
      };
    }),
  );
}

/** Revision numbers by sheet of the newest submittal that went out; undefined when none did. */
async function lastSent(db: Knex, officeId: string, jobId: string): Promise<Map<string, number> | undefined> {
  const sent = (await submittalsOf(db, officeId, jobId)).filter(
    (s) => s.state === 'sent' || s.state === 'decided',
  );
  const last = sent.at(-1);
  if (!last) return undefined;
  const revisions = await revisionsOfSubmittal(db, officeId, last.id);
  return new Map(revisions.map((r) => [r.sheet_id, r.number]));
}
