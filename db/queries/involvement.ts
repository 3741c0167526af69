// server only
import type { Knex } from 'knex';

/** Who wrote in a sheet: kept a draft, froze a revision, or originated it. */
export async function writersOfSheet(db: Knex, officeId: string, sheetId: string): Promise<string[]> {
  const own = { office_id: officeId, sheet_id: sheetId };
  const [kept, froze, made] = await Promise.all([
    db('drafts').where(own).distinct().pluck('kept_by'),
    db('revisions').where(own).distinct().pluck('originator_id'),
    db('sheets').where({ office_id: officeId, id: sheetId }).pluck('originator_id'),
  ]);
  return [...new Set<string>([...kept, ...froze, ...made])];
}

/** Who wrote in any sheet of a job but one made for a check, or has a part in it other than checking. */
export async function involvedInJob(db: Knex, officeId: string, jobId: string): Promise<string[]> {
  const sheets: string[] = await db('sheets')
    .where({ office_id: officeId, job_id: jobId })
    .whereNotIn('id', db('check_sheets').where({ office_id: officeId }).select('sheet_id'))
    .pluck('id');
  const named: string[] = await db('job_people')
    .where({ office_id: officeId, job_id: jobId })
    .whereNot({ part: 'checker' })
    .pluck('person_id');
  const sending: string[] = await db('submittals')
    .where({ office_id: officeId, job_id: jobId })
    .pluck('created_by');
  const writers = await Promise.all(sheets.map((id) => writersOfSheet(db, officeId, id)));
  return [...new Set([...writers.flat(), ...named, ...sending])];
}
