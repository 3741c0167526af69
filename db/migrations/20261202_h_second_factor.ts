import type { Knex } from 'knex';

/** A second factor for signing in: one secret a person, recovery codes kept as hashes, and whether sealing asks for it. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('second_factors', (t) => {
    t.string('person_id', 36).primary().references('people.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('secret', 64).notNullable();
    t.datetime('confirmed_at', { precision: 3 });
    t.bigInteger('last_step').notNullable().defaultTo(0);
  });
  await knex.schema.createTable('recovery_codes', (t) => {
    t.string('id', 64).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('person_id', 36).notNullable().references('people.id');
    t.datetime('used_at', { precision: 3 });
  });
  await knex.schema.alterTable('offices', (t) => {
    t.boolean('seal_needs_second').notNullable().defaultTo(false);
  });
  await knex.raw(
    "ALTER TABLE one_time_tokens MODIFY purpose ENUM('invitation', 'password', 'second-step') NOT NULL",
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex('one_time_tokens').where({ purpose: 'second-step' }).delete();
  await knex.raw("ALTER TABLE one_time_tokens MODIFY purpose ENUM('invitation', 'password') NOT NULL");
  await knex.schema.alterTable('offices', (t) => t.dropColumn('seal_needs_second'));
  await knex.schema.dropTable('recovery_codes');
  await knex.schema.dropTable('second_factors');
}
