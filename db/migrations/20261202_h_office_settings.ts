import type { Knex } from 'knex';

/** What an office settles for all its people: after how many days something that waits is called late. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('offices', (t) => {
    t.integer('late_after').notNullable().defaultTo(10);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('offices', (t) => t.dropColumn('late_after'));
}
