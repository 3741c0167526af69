import type { Knex } from 'knex';

const frozen = ['check_sheets', 'check_comparisons'];

/** Checking without the designer's sheet: the checker's own sheet, and its values beside the designer's, frozen. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('check_sheets', (t) => {
    t.string('check_id', 36).primary().references('checks.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('sheet_id', 36).notNullable().unique().references('sheets.id');
    t.datetime('begun_at', { precision: 3 }).notNullable();
  });
  await knex.schema.createTable('check_comparisons', (t) => {
    t.string('check_id', 36).primary().references('checks.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('own_revision_id', 36).notNullable().references('revisions.id');
    t.json('pairs').notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
  });
  for (const table of frozen)
    for (const verb of ['UPDATE', 'DELETE'])
      await knex.raw(
        `CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${table} are frozen and cannot be changed'`,
      );
  await knex.raw(`ALTER TABLE marks MODIFY place ENUM('line', 'input', 'basis') NOT NULL DEFAULT 'line'`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('check_comparisons');
  await knex.schema.dropTable('check_sheets');
  await knex.raw(`ALTER TABLE marks MODIFY place ENUM('line', 'input') NOT NULL DEFAULT 'line'`);
}
