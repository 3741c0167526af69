import type { Knex } from 'knex';

/** Answers as rows of their own, so that none overwrites another; submittals that a change made void, and who seals them. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('mark_answers', (t) => {
    t.bigIncrements('id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('mark_id', 36).notNullable().references('marks.id').onDelete('CASCADE');
    t.string('text', 1000).notNullable();
    t.string('person_id', 36).notNullable().references('people.id');
    t.datetime('at', { precision: 3 }).notNullable();
  });
  await knex.schema.createTable('responses', (t) => {
    t.bigIncrements('id');
    t.string('office_id', 36).notNullable().references('offices.id');
    t.string('comment_id', 36).notNullable().references('comments.id');
    t.enum('kind', ['answered', 'accepted', 'reopened']).notNullable();
    t.string('text', 2000).notNullable();
    t.string('place', 120).notNullable().defaultTo('');
    t.string('author', 120).notNullable();
    t.datetime('at', { precision: 3 }).notNullable();
  });
  await knex.raw(
    `INSERT INTO mark_answers (office_id, mark_id, text, person_id, at) SELECT m.office_id, m.id, m.answer, r.originator_id, m.at FROM marks m JOIN checks c ON c.id = m.check_id JOIN revisions r ON r.id = c.revision_id WHERE m.answer IS NOT NULL`,
  );
  await knex.raw(
    `INSERT INTO responses (office_id, comment_id, kind, text, author, at) SELECT c.office_id, c.id, 'answered', c.answer, p.name, c.at FROM comments c JOIN submittals s ON s.id = c.submittal_id JOIN people p ON p.id = s.created_by WHERE c.answer IS NOT NULL`,
  );
  await knex.schema.alterTable('marks', (t) => t.dropColumn('answer'));
  await knex.schema.alterTable('comments', (t) => t.dropColumn('answer'));
  await knex.raw(
    `ALTER TABLE submittals MODIFY state ENUM('drafted', 'sealed', 'sent', 'decided', 'void') NOT NULL, ADD void_reason VARCHAR(300) NULL, ADD engineer_id VARCHAR(36) NULL`,
  );
  await knex.raw('UPDATE submittals SET engineer_id = created_by');
  await knex.raw(
    'ALTER TABLE submittals MODIFY engineer_id VARCHAR(36) NOT NULL, ADD CONSTRAINT submittals_engineer_id_foreign FOREIGN KEY (engineer_id) REFERENCES people (id)',
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(
    `ALTER TABLE submittals DROP FOREIGN KEY submittals_engineer_id_foreign, DROP COLUMN engineer_id, DROP COLUMN void_reason, MODIFY state ENUM('drafted', 'sealed', 'sent', 'decided') NOT NULL`,
  );
  await knex.schema.alterTable('comments', (t) => t.string('answer', 2000));
  await knex.schema.alterTable('marks', (t) => t.string('answer', 1000));
  await knex.schema.dropTable('responses');
  await knex.schema.dropTable('mark_answers');
}
