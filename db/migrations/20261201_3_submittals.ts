import type { Knex } from 'knex';

/** What goes out: submittals, their files, seals, transmittals, mail, and what the reviewer answers. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('submittals', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('job_id', 36).notNullable().references('jobs.id');
    t.integer('number').notNullable();
    t.string('purpose', 200).notNullable();
    t.string('remarks', 2000).notNullable();
    t.enum('state', ['drafted', 'sealed', 'sent', 'decided']).notNullable();
    t.integer('pages').notNullable();
    t.string('created_by', 36).notNullable().references('people.id');
    t.datetime('created_at', { precision: 3 }).notNullable();
    t.unique(['job_id', 'number']);
  });
  await knex.schema.createTable('submittal_revisions', (t) => {
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.string('revision_id', 36).notNullable().references('revisions.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.integer('position').notNullable();
    t.primary(['submittal_id', 'revision_id']);
  });
  await knex.schema.createTable('files', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.enum('kind', ['unsigned', 'sealed']).notNullable();
    t.specificType('bytes', 'LONGBLOB').notNullable();
    t.string('sha256', 64).notNullable();
    t.datetime('made_at', { precision: 3 }).notNullable();
    t.string('signed_by', 160);
    t.unique(['submittal_id', 'kind']);
  });
  await knex.schema.createTable('prepared_seals', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.string('person_id', 36).notNullable().references('people.id');
    t.string('licence_id', 36).notNullable().references('licences.id');
    t.specificType('bytes', 'LONGBLOB').notNullable();
    t.json('hole').notNullable();
    t.datetime('expires_at', { precision: 3 }).notNullable();
  });
  await knex.schema.createTable('transmittals', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('job_id', 36).notNullable().references('jobs.id');
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.integer('number').notNullable();
    t.string('recipient', 190).notNullable();
    t.text('contents').notNullable();
    t.string('sent_by', 36).notNullable().references('people.id');
    t.datetime('sent_at', { precision: 3 }).notNullable();
    t.unique(['job_id', 'number']);
  });
  await knex.schema.createTable('mails', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('submittal_id', 36).references('submittals.id');
    t.string('recipient', 190).notNullable();
    t.string('subject', 200).notNullable();
    t.text('body').notNullable();
    t.enum('state', ['queued', 'sending', 'accepted', 'refused']).notNullable();
    t.integer('attempts').notNullable().defaultTo(0);
    t.string('server_words', 500).notNullable().defaultTo('');
    t.datetime('next_try', { precision: 3 }).notNullable();
    t.datetime('claimed_at', { precision: 3 });
    t.index(['state', 'next_try']);
  });
  await knex.schema.createTable('review_links', (t) => {
    t.string('id', 64).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.string('reviewer', 120).notNullable();
    t.string('email', 190).notNullable();
    t.datetime('expires_at', { precision: 3 }).notNullable();
    t.datetime('revoked_at', { precision: 3 });
    t.datetime('opened_at', { precision: 3 });
  });
  await knex.schema.createTable('comments', (t) => {
    t.string('id', 36).primary();
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('submittal_id', 36).notNullable().references('submittals.id');
    t.integer('number').notNullable();
    t.string('revision_id', 36).references('revisions.id');
    t.string('line', 40).notNullable();
    t.string('code', 200).notNullable();
    t.string('text', 2000).notNullable();
    t.string('author', 120).notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
    t.string('answer', 2000);
    t.unique(['submittal_id', 'number']);
  });
  await knex.schema.createTable('decisions', (t) => {
    t.string('submittal_id', 36).primary().references('submittals.id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('words', 80).notNullable();
    t.string('author', 120).notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  const tables = [
    'decisions',
    'comments',
    'review_links',
    'mails',
    'transmittals',
    'prepared_seals',
    'files',
  ];
  for (const table of [...tables, 'submittal_revisions', 'submittals'])
    await knex.schema.dropTableIfExists(table);
}
