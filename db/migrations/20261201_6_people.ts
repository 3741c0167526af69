import type { Knex } from 'knex';

/** Who does what on a job, licences that were withdrawn, tokens for programs, and the office of a session. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('job_people', (t) => {
    t.string('job_id', 36).notNullable().references('jobs.id');
    t.enum('part', ['engineer-of-record', 'originator', 'checker']).notNullable();
    t.string('person_id', 36).notNullable().references('people.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.primary(['job_id', 'part', 'person_id']);
  });
  await knex.schema.createTable('api_tokens', (t) => {
    t.string('id', 64).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('person_id', 36).notNullable().references('people.id');
    t.string('name', 80).notNullable();
    t.datetime('made_at', { precision: 3 }).notNullable();
    t.datetime('expires_at', { precision: 3 }).notNullable();
    t.datetime('revoked_at', { precision: 3 });
  });
  await knex.schema.alterTable('licences', (t) => {
    t.datetime('withdrawn_at', { precision: 3 });
  });
  await knex('sessions').delete();
  await knex.schema.alterTable('sessions', (t) => {
    t.string('office_id', 36).notNullable().references('offices.id');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('sessions', (t) => {
    t.dropForeign('office_id');
    t.dropColumn('office_id');
  });
  await knex.schema.alterTable('licences', (t) => t.dropColumn('withdrawn_at'));
  await knex.schema.dropTable('api_tokens');
  await knex.schema.dropTable('job_people');
}
