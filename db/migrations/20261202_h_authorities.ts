import type { Knex } from 'knex';

/** What an authority asks for before a package reaches it: how it wants to be sent, and its own list of things to see to. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('authorities', (t) => {
    t.enum('wish', ['link', 'attachment']).notNullable().defaultTo('link');
    t.json('checklist').notNullable().defaultTo('[]');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('authorities', (t) => t.dropColumns('wish', 'checklist'));
}
