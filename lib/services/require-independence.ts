// server only
import type { Knex } from 'knex';
import { involvedInJob, writersOfSheet } from '@/db/queries/involvement';
import type { PersonRow } from '@/db/queries/people';
import type { RevisionLine } from '@/db/queries/revisions';
import { refuse } from './service-error';

interface Asked {
  category: number;
  standardSolution: string;
}

/** Refuses a checker whom the category of independence rules out, by what the record knows of them. */
export async function requireIndependence(
  trx: Knex,
  checker: PersonRow,
  r: RevisionLine,
  { category, standardSolution }: Asked,
): Promise<void> {
  if (checker.id === r.originator_id)
    refuse('checker-is-originator', 'checkerId', 'The checker of a sheet is never its originator.');
  if ((await writersOfSheet(trx, r.office_id, r.sheet_id)).includes(checker.id))
    refuse('checker-wrote', 'checkerId', `${checker.name} wrote in this sheet and cannot check it.`);
  if (category === 0 && standardSolution === '')
    refuse('no-standard', 'standardSolution', 'Name the standard solution that the sheet is held against.');
  if (category < 2) return;
  if ((await involvedInJob(trx, r.office_id, r.job_id)).includes(checker.id))
    refuse(
      'checker-involved',
      'checkerId',
      `${checker.name} has a part in this job. Category ${category} asks for someone who has none.`,
    );
  if (category === 3 && checker.organisation === '')
    refuse(
      'same-organisation',
      'checkerId',
      `${checker.name} belongs to the office. Category 3 asks for someone of another organisation, named as such under Office.`,
    );
}
