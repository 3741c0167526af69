// server only
import type { Knex } from 'knex';
import { type RevisionLine, revisionsOfSheet } from '@/db/queries/revisions';
import { blocks } from '@/templates/block';
import { lastChanged } from '@/templates/last-changed';
import type { Changes } from './changes-since';

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
  changes: Changes,
  revisions: readonly RevisionLine[],
): Promise<RevisionPast[]> {
  return Promise.all(
    revisions.map(async (r): Promise<RevisionPast> => {
      const all = await revisionsOfSheet(db, officeId, r.sheet_id);
      const past = all.filter((other) => other.number <= r.number).reverse();
      const how = changes.of.get(r.id);
      const since = changes.since === undefined || how === undefined || how === 'same' ? {} : { since: how };
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
