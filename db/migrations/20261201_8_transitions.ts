import type { Knex } from 'knex';

/** Rules that hold whoever writes: what is never deleted, what stays as written, and which state may follow which. */
const rules: { name: string; on: string; unless: string; said: string }[] = [
  ...[
    'jobs',
    'sheets',
    'checks',
    'submittals',
    'comments',
    'review_links',
    'drafts',
    'people',
    'licences',
  ].map((table) => ({
    name: `${table}_no_delete`,
    on: `DELETE ON ${table}`,
    unless: 'FALSE',
    said: `${table} are kept and cannot be deleted`,
  })),
  ...['drafts', 'responses', 'mark_answers', 'comments'].map((table) => ({
    name: `${table}_no_update`,
    on: `UPDATE ON ${table}`,
    unless: 'FALSE',
    said: `${table} are frozen and cannot be changed`,
  })),
  {
    name: 'responses_no_delete',
    on: 'DELETE ON responses',
    unless: 'FALSE',
    said: 'responses are frozen and cannot be changed',
  },
  {
    name: 'sheets_keep_number',
    on: 'UPDATE ON sheets',
    unless:
      'NEW.number = OLD.number AND NEW.job_id = OLD.job_id AND NEW.office_id = OLD.office_id AND NEW.originator_id = OLD.originator_id',
    said: 'the number of a sheet is frozen and cannot be changed',
  },
  {
    name: 'checks_transition',
    on: 'UPDATE ON checks',
    unless:
      "NEW.revision_id = OLD.revision_id AND NEW.checker_id = OLD.checker_id AND ((OLD.state = 'open' AND NEW.state IN ('agreed', 'returned', 'void')) OR (OLD.state IN ('agreed', 'returned') AND NEW.state = 'void'))",
    said: 'a check cannot go from this state to that one',
  },
  ...['INSERT', 'UPDATE', 'DELETE'].map((verb) => ({
    name: `marks_${verb.toLowerCase()}_while_open`,
    on: `${verb} ON marks`,
    unless: `(SELECT state FROM checks WHERE id = ${verb === 'INSERT' ? 'NEW' : 'OLD'}.check_id) = 'open'`,
    said: 'marks of a closed check are frozen and cannot be changed',
  })),
  {
    name: 'submittals_transition',
    on: 'UPDATE ON submittals',
    unless:
      "NEW.job_id = OLD.job_id AND NEW.number = OLD.number AND NEW.pages = OLD.pages AND NEW.purpose = OLD.purpose AND NEW.engineer_id = OLD.engineer_id AND ((OLD.state = 'drafted' AND NEW.state IN ('sealed', 'void')) OR (OLD.state = 'sealed' AND NEW.state IN ('sent', 'void')) OR (OLD.state = 'sent' AND NEW.state = 'decided'))",
    said: 'a submittal cannot go from this state to that one',
  },
];

export async function up(knex: Knex): Promise<void> {
  for (const { name, on, unless, said } of rules) {
    await knex.raw(
      `CREATE TRIGGER ${name} BEFORE ${on} FOR EACH ROW IF NOT (${unless}) THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${said}'; END IF`,
    );
  }
}

export async function down(knex: Knex): Promise<void> {
  for (const { name } of rules) await knex.raw(`DROP TRIGGER IF EXISTS ${name}`);
}
