// server only
import type { Knex } from 'knex';

export interface JobRow {
  id: string;
  office_id: string;
  number: string;
  title: string;
  place: string;
  jurisdiction: string;
  authority_id: string | null;
  units: 'US' | 'SI';
  page_size: 'Letter' | 'A4';
  codes: string;
  state: 'open' | 'closed';
  next_sheet: number;
  next_submittal: number;
  changed_at: Date;
}

const columns = { number: 'j.number', title: 'j.title', changed: 'j.changed_at' } as const;

export async function findJobs(
  db: Knex,
  officeId: string,
  ask: { search: string; sort: keyof typeof columns; state: 'open' | 'closed'; page: number; size: number },
): Promise<{ rows: (JobRow & { authority: string | null })[]; total: number }> {
  const like = `%${ask.search.replace(/[%_\\]/g, '\\$&')}%`;
  const matching = () =>
    db('jobs as j')
      .leftJoin('authorities as a', 'a.id', 'j.authority_id')
      .where({ 'j.office_id': officeId, 'j.state': ask.state })
      .where((q) => {
        for (const c of ['j.number', 'j.title', 'j.place', 'a.name']) q.orWhere(c, 'like', like);
      });
  const count = await matching().count({ n: '*' }).first();
  const rows = await matching()
    .orderBy(columns[ask.sort], ask.sort === 'title' ? 'asc' : 'desc')
    .limit(ask.size)
    .offset((ask.page - 1) * ask.size)
    .select('j.*', 'a.name as authority');
  return { rows, total: Number(count?.n) };
}

export async function jobById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<(JobRow & { authority: string | null }) | undefined> {
  return db('jobs as j')
    .leftJoin('authorities as a', 'a.id', 'j.authority_id')
    .where({ 'j.office_id': officeId, 'j.id': id })
    .first('j.*', 'a.name as authority');
}

export async function insertJob(
  trx: Knex,
  row: Omit<JobRow, 'state' | 'next_sheet' | 'next_submittal'>,
): Promise<void> {
  await trx('jobs').insert(row);
}

export async function touchJob(trx: Knex, officeId: string, id: string): Promise<void> {
  await trx('jobs').where({ office_id: officeId, id }).update({ changed_at: new Date() });
}

/** The next number of a job's counter; numbers are given once and never again. */
export async function takeNumber(
  trx: Knex.Transaction,
  officeId: string,
  jobId: string,
  counter: 'next_sheet' | 'next_submittal',
): Promise<number | undefined> {
  const job: JobRow | undefined = await trx('jobs')
    .where({ office_id: officeId, id: jobId })
    .forUpdate()
    .first();
  if (!job) return undefined;
  await trx('jobs')
    .where({ office_id: officeId, id: jobId })
    .update({ [counter]: job[counter] + 1 });
  return job[counter];
}

export async function setJobState(
  trx: Knex,
  officeId: string,
  id: string,
  state: JobRow['state'],
): Promise<number> {
  return trx('jobs').where({ office_id: officeId, id }).update({ state, changed_at: new Date() });
}

export const jobParts = ['engineer-of-record', 'originator', 'checker'] as const;
export type JobPart = (typeof jobParts)[number];

export interface JobPersonRow {
  job_id: string;
  office_id: string;
  person_id: string;
  part: JobPart;
}

/** Who does what on a job. */
export async function jobPeople(
  db: Knex,
  officeId: string,
  jobId: string,
): Promise<(JobPersonRow & { name: string; initials: string })[]> {
  return db('job_people as jp')
    .join('people as p', 'p.id', 'jp.person_id')
    .where({ 'jp.office_id': officeId, 'jp.job_id': jobId })
    .orderBy(['jp.part', 'p.name'])
    .select('jp.*', 'p.name', 'p.initials');
}

/** Gives one part of a job to these people and to nobody else. */
export async function setJobPeople(
  trx: Knex,
  officeId: string,
  jobId: string,
  part: JobPart,
  personIds: readonly string[],
): Promise<void> {
  await trx('job_people').where({ office_id: officeId, job_id: jobId, part }).delete();
  const rows = personIds.map((person_id) => ({ job_id: jobId, office_id: officeId, part, person_id }));
  if (rows.length > 0) await trx('job_people').insert(rows);
}

export interface AuthorityRow {
  id: string;
  office_id: string;
  name: string;
  decisions: string[];
  reviewer: string | null;
  email: string | null;
  /** How it wants a package: by a link, or also attached to the letter. */
  wish: 'link' | 'attachment';
  /** What it wants seen to before anything is sent, in its own words. */
  checklist: string[];
}

type WrittenAuthority = Omit<AuthorityRow, 'wish' | 'checklist'> & Partial<AuthorityRow>;

const asColumns = ({ decisions, checklist, ...row }: Partial<AuthorityRow>) => ({
  ...row,
  decisions: JSON.stringify(decisions),
  ...(checklist ? { checklist: JSON.stringify(checklist) } : {}),
});

export async function authoritiesOf(db: Knex, officeId: string): Promise<AuthorityRow[]> {
  return db('authorities').where({ office_id: officeId }).orderBy('name');
}

export async function authorityById(
  db: Knex,
  officeId: string,
  id: string,
): Promise<AuthorityRow | undefined> {
  return db('authorities').where({ office_id: officeId, id }).first();
}

export async function insertAuthority(db: Knex, row: WrittenAuthority): Promise<void> {
  await db('authorities').insert(asColumns(row));
}

export async function changeAuthority(
  trx: Knex,
  { office_id, id, ...row }: WrittenAuthority,
): Promise<number> {
  return trx('authorities').where({ office_id, id }).update(asColumns(row));
}
