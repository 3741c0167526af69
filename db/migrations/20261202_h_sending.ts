import type { Knex } from 'knex';

/** A transmittal says what is asked for and what was seen to; a letter may carry the sealed file. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('transmittals', (t) => {
    t.string('action', 200).notNullable().defaultTo('');
    t.json('seen_to').notNullable().defaultTo('[]');
    t.boolean('attached').notNullable().defaultTo(false);
  });
  await knex.schema.alterTable('mails', (t) => {
    t.boolean('attached').notNullable().defaultTo(false);
    t.string('link_id', 64).references('review_links.id');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('mails', (t) => {
    t.dropForeign('link_id');
    t.dropColumns('attached', 'link_id');
  });
  await knex.schema.alterTable('transmittals', (t) => t.dropColumns('action', 'seen_to', 'attached'));
}
