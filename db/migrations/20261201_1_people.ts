import type { Knex } from 'knex';

/** Offices, the people in them, and what lets them in. Times are UTC with milliseconds. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('offices', (t) => {
    t.string('id', 36).primary();
    t.string('name', 120).notNullable();
    t.string('zone', 60).notNullable();
  });
  await knex.schema.createTable('people', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('email', 190).notNullable().unique();
    t.string('name', 120).notNullable();
    t.string('initials', 4).notNullable();
    t.json('roles').notNullable();
    t.string('password_hash', 255);
    t.boolean('active').notNullable().defaultTo(true);
  });
  await knex.schema.createTable('licences', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('person_id', 36).notNullable().references('people.id');
    t.string('jurisdiction', 80).notNullable();
    t.string('profession', 80).notNullable();
    t.string('number', 40).notNullable();
    t.date('expires').notNullable();
  });
  await knex.schema.createTable('sessions', (t) => {
    t.string('id', 64).primary();
    t.string('user_id', 36).notNullable().references('people.id').onDelete('CASCADE');
    t.datetime('expires_at').notNullable();
  });
  await knex.schema.createTable('one_time_tokens', (t) => {
    t.string('id', 64).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('person_id', 36).notNullable().references('people.id');
    t.enum('purpose', ['invitation', 'password']).notNullable();
    t.datetime('expires_at').notNullable();
    t.datetime('used_at');
  });
  await knex.schema.createTable('attempts', (t) => {
    t.bigIncrements('id');
    t.string('subject', 190).notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
    t.index(['subject', 'at']);
  });
  await knex.schema.createTable('audit', (t) => {
    t.bigIncrements('id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.datetime('at', { precision: 3 }).notNullable();
    t.string('person', 160).notNullable();
    t.string('verb', 60).notNullable();
    t.string('subject', 120).notNullable();
    t.string('digest', 64);
    t.string('before_hash', 64).notNullable();
    t.string('hash', 64).notNullable();
    t.index(['office_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['audit', 'attempts', 'one_time_tokens', 'sessions', 'licences', 'people', 'offices']) {
    await knex.schema.dropTableIfExists(table);
  }
}
