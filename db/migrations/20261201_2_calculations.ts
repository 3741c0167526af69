import type { Knex } from 'knex';

/** Jobs, sheets with their drafts, and the revisions that are frozen from them. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('authorities', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('name', 120).notNullable();
    t.json('decisions').notNullable();
    t.string('reviewer', 120);
    t.string('email', 190);
  });
  await knex.schema.createTable('jobs', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('number', 20).notNullable();
    t.string('title', 120).notNullable();
    t.string('place', 160).notNullable();
    t.string('jurisdiction', 80).notNullable();
    t.string('authority_id', 36).references('authorities.id');
    t.enum('units', ['US', 'SI']).notNullable();
    t.enum('page_size', ['Letter', 'A4']).notNullable();
    t.text('codes').notNullable();
    t.enum('state', ['open', 'closed']).notNullable().defaultTo('open');
    t.integer('next_sheet').notNullable().defaultTo(1);
    t.integer('next_submittal').notNullable().defaultTo(1);
    t.datetime('changed_at', { precision: 3 }).notNullable();
    t.unique(['office_id', 'number']);
  });
  await knex.schema.createTable('sheets', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('job_id', 36).notNullable().references('jobs.id');
    t.integer('number').notNullable();
    t.string('title', 120).notNullable();
    t.string('originator_id', 36).notNullable().references('people.id');
    t.datetime('changed_at', { precision: 3 }).notNullable();
    t.unique(['job_id', 'number']);
  });
  await knex.schema.createTable('drafts', (t) => {
    t.string('sheet_id', 36).notNullable().references('sheets.id');
    t.integer('version').notNullable();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.json('body').notNullable();
    t.string('kept_by', 36).notNullable().references('people.id');
    t.datetime('kept_at', { precision: 3 }).notNullable();
    t.primary(['sheet_id', 'version']);
  });
  await knex.schema.createTable('revisions', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('sheet_id', 36).notNullable().references('sheets.id');
    t.integer('number').notNullable();
    t.string('reason', 500).notNullable();
    t.json('inputs').notNullable();
    t.json('results').notNullable();
    t.json('blocks').notNullable();
    t.string('engine', 20).notNullable();
    t.string('digest', 64).notNullable();
    t.string('originator_id', 36).notNullable().references('people.id');
    t.datetime('frozen_at', { precision: 3 }).notNullable();
    t.unique(['sheet_id', 'number']);
  });
  await knex.schema.createTable('checks', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('revision_id', 36).notNullable().unique().references('revisions.id');
    t.string('checker_id', 36).notNullable().references('people.id');
    t.integer('category').notNullable();
    t.enum('state', ['open', 'agreed', 'returned', 'void']).notNullable();
    t.string('note', 1000).notNullable().defaultTo('');
    t.datetime('opened_at', { precision: 3 }).notNullable();
    t.datetime('closed_at', { precision: 3 });
  });
  await knex.schema.createTable('marks', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('check_id', 36).notNullable().references('checks.id');
    t.string('line', 40).notNullable();
    t.enum('kind', ['agrees', 'correct', 'query']).notNullable();
    t.string('text', 1000).notNullable();
    t.string('answer', 1000);
    t.datetime('at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['marks', 'checks', 'revisions', 'drafts', 'sheets', 'jobs', 'authorities']) {
    await knex.schema.dropTableIfExists(table);
  }
}
