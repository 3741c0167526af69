import type { Knex } from 'knex';

/** What the walk of each night found in the record of each office; one a day, whichever server made it. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('record_walks', (t) => {
    t.string('office_id', 36).notNullable().references('offices.id');
    t.date('day').notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
    t.bigInteger('entries').notNullable();
    t.bigInteger('broken');
    t.primary(['office_id', 'day']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('record_walks');
}
