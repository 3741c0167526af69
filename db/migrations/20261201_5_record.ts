import type { Knex } from 'knex';

/** The record: whom and what an entry is about, and the end of each office's chain of entries. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('audit', (t) => {
    t.string('subject', 400).notNullable().alter();
    t.string('person_id', 36);
    t.string('job_id', 36);
    t.string('about_id', 64);
    t.index(['office_id', 'job_id', 'id']);
    t.index(['office_id', 'about_id', 'id']);
  });
  // Its own table and not the office's row: every row of an office holds a shared lock on that one through its foreign key.
  await knex.schema.createTable('audit_heads', (t) => {
    t.string('office_id', 36).primary();
    t.string('hash', 64).notNullable();
  });
  await knex.raw(
    `INSERT INTO audit_heads SELECT o.id, COALESCE((SELECT a.hash FROM audit a WHERE a.office_id = o.id ORDER BY a.id DESC LIMIT 1), REPEAT('0', 64)) FROM offices o`,
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('audit_heads');
  await knex.schema.alterTable('audit', (t) => {
    t.dropIndex(['office_id', 'job_id', 'id']);
    t.dropIndex(['office_id', 'about_id', 'id']);
    t.dropColumns('person_id', 'job_id', 'about_id');
    t.string('subject', 120).notNullable().alter();
  });
}
