// server only
import type { Knex } from 'knex';

export interface RecordWalk {
  at: Date;
  entries: number;
  /** Place, from 0, of the first entry that does not hold; null when all do. */
  broken: number | null;
}

/** Offices whose record was not walked on this day (UTC). */
export async function officesNotWalked(db: Knex, day: string): Promise<string[]> {
  return db('offices as o')
    .leftJoin('record_walks as w', (on) => {
      on.on('w.office_id', 'o.id').andOn('w.day', db.raw('?', [day]));
    })
    .whereNull('w.office_id')
    .pluck('o.id');
}

/** Keeps what a walk found. Answers false when another server did so first. */
export async function insertWalk(
  trx: Knex,
  officeId: string,
  day: string,
  walk: RecordWalk,
): Promise<boolean> {
  const [result] = await trx.raw(
    'INSERT IGNORE INTO record_walks (office_id, day, at, entries, broken) VALUES (?, ?, ?, ?, ?)',
    [officeId, day, walk.at, walk.entries, walk.broken],
  );
  return result.affectedRows === 1;
}

export async function newestWalk(db: Knex, officeId: string): Promise<RecordWalk | undefined> {
  const row = await db('record_walks').where({ office_id: officeId }).orderBy('day', 'desc').first();
  return (
    row && {
      at: row.at,
      entries: Number(row.entries),
      broken: row.broken === null ? null : Number(row.broken),
    }
  );
}
