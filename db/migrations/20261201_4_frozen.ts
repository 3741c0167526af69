import type { Knex } from 'knex';

/** Rows that are the record: once written, the database itself refuses to change or delete them. */
const frozen = ['revisions', 'files', 'transmittals', 'decisions', 'audit', 'submittal_revisions'];

export async function up(knex: Knex): Promise<void> {
  for (const table of frozen) {
    for (const verb of ['UPDATE', 'DELETE']) {
      const name = `${table}_no_${verb.toLowerCase()}`;
      const said = `${table} are frozen and cannot be changed`;
      await knex.raw(
        `CREATE TRIGGER ${name} BEFORE ${verb} ON ${table} FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${said}'`,
      );
    }
  }
}

export async function down(knex: Knex): Promise<void> {
  for (const table of frozen) {
    for (const verb of ['update', 'delete']) await knex.raw(`DROP TRIGGER IF EXISTS ${table}_no_${verb}`);
  }
}
