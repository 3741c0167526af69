// server only
import type { Knex } from 'knex';

interface OnJob {
  id: string;
  job_id: string;
  job_title: string;
  job_number: string;
  since: Date;
}

const open = { 'j.state': 'open' } as const;

/** Checks that are open: those given to a person, and those of sheets that the person made. */
export async function openChecksAround(
  db: Knex,
  officeId: string,
  personId: string,
): Promise<
  (OnJob & { revision_id: string; number: number; title: string; checker: string; mine: number })[]
> {
  return db('checks as c')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .join('jobs as j', 'j.id', 's.job_id')
    .join('people as p', 'p.id', 'c.checker_id')
    .where({ 'c.office_id': officeId, 'c.state': 'open', ...open })
    .where((q) => q.where({ 'c.checker_id': personId }).orWhere({ 'r.originator_id': personId }))
    .orderBy('c.opened_at')
    .select('c.id', 's.job_id', 's.number', 's.title', 'j.title as job_title', 'j.number as job_number')
    .select('c.opened_at as since', 'c.revision_id', 'p.name as checker')
    .select(db.raw('c.checker_id = ? as mine', [personId]));
}

/** Newest revisions of a person's sheets that their checker returned. */
export async function returnedChecksOf(
  db: Knex,
  officeId: string,
  personId: string,
): Promise<(OnJob & { number: number; title: string; checker: string })[]> {
  return db('checks as c')
    .join('revisions as r', 'r.id', 'c.revision_id')
    .join('sheets as s', 's.id', 'r.sheet_id')
    .join('jobs as j', 'j.id', 's.job_id')
    .join('people as p', 'p.id', 'c.checker_id')
    .where({ 'c.office_id': officeId, 'c.state': 'returned', 'r.originator_id': personId, ...open })
    .orderBy('c.closed_at')
    .select('s.id', 's.job_id', 's.number', 's.title', 'j.title as job_title', 'j.number as job_number')
    .select('c.closed_at as since', 'p.name as checker');
}

export interface SubmittalWork extends OnJob {
  number: number;
  state: 'drafted' | 'sealed' | 'sent' | 'decided';
  /** Whether the person is the engineer of record named on its cover. */
  seals: number;
  engineer: string;
  last_sent: Date | null;
  /** When the last link that still stands runs out; null when none stands. */
  link_ends: Date | null;
  refused: number;
}

/** Submittals in hand that a person gathered or seals. */
export async function submittalWork(db: Knex, officeId: string, personId: string): Promise<SubmittalWork[]> {
  return db('submittals as s')
    .join('jobs as j', 'j.id', 's.job_id')
    .join('people as p', 'p.id', 's.engineer_id')
    .where({ 's.office_id': officeId, ...open })
    .whereIn('s.state', ['drafted', 'sealed', 'sent'])
    .where((q) => q.where({ 's.created_by': personId }).orWhere({ 's.engineer_id': personId }))
    .orderBy('s.created_at')
    .select('s.id', 's.job_id', 's.number', 's.state', 'j.title as job_title', 'j.number as job_number')
    .select('p.name as engineer', db.raw('s.engineer_id = ? as seals', [personId]))
    .select(
      db.raw(
        "COALESCE((SELECT MAX(f.made_at) FROM files f WHERE f.submittal_id = s.id AND f.kind = 'sealed'), s.created_at) as since",
      ),
      db.raw('(SELECT MAX(t.sent_at) FROM transmittals t WHERE t.submittal_id = s.id) as last_sent'),
      db.raw(
        '(SELECT MAX(l.expires_at) FROM review_links l WHERE l.submittal_id = s.id AND l.revoked_at IS NULL) as link_ends',
      ),
      db.raw("(SELECT COUNT(*) FROM mails m WHERE m.submittal_id = s.id AND m.state = 'refused') as refused"),
    );
}

/** Submittals with comments that wait for an answer, of a person who gathered or seals them. */
export async function commentsToAnswer(
  db: Knex,
  officeId: string,
  personId: string,
): Promise<(OnJob & { number: number; count: number })[]> {
  return db('comments as c')
    .join('submittals as s', 's.id', 'c.submittal_id')
    .join('jobs as j', 'j.id', 's.job_id')
    .where({ 'c.office_id': officeId, ...open })
    .where((q) => q.where({ 's.created_by': personId }).orWhere({ 's.engineer_id': personId }))
    .whereRaw(
      "COALESCE((SELECT p.kind FROM responses p WHERE p.comment_id = c.id ORDER BY p.id DESC LIMIT 1), 'reopened') = 'reopened'",
    )
    .groupBy('s.id', 's.job_id', 's.number', 'j.title', 'j.number')
    .orderBy('since')
    .select('s.id', 's.job_id', 's.number', 'j.title as job_title', 'j.number as job_number')
    .min({ since: 'c.at' })
    .count({ count: 'c.id' });
}
