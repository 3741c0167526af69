import type { Knex } from 'knex';

const checksStay = (more: string) =>
  `CREATE TRIGGER checks_transition BEFORE UPDATE ON checks FOR EACH ROW IF NOT (NEW.revision_id = OLD.revision_id AND NEW.checker_id = OLD.checker_id ${more} AND ((OLD.state = 'open' AND NEW.state IN ('agreed', 'returned', 'void')) OR (OLD.state IN ('agreed', 'returned') AND NEW.state = 'void'))) THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a check cannot go from this state to that one'; END IF`;

/** Checking in full: what a check was asked to be, marks at inputs with the drawing, and every step a mark goes through. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('people', (t) => {
    // Blank: the office's own.
    t.string('organisation', 120).notNullable().defaultTo('');
  });
  await knex.schema.alterTable('checks', (t) => {
    t.string('standard_solution', 200).notNullable().defaultTo('');
    t.boolean('inputs_asked').notNullable().defaultTo(false);
    t.boolean('blind').notNullable().defaultTo(false);
    t.string('declaration', 300).notNullable().defaultTo('');
  });
  await knex.raw(
    `ALTER TABLE marks MODIFY line VARCHAR(250) NOT NULL, ADD place ENUM('line', 'input') NOT NULL DEFAULT 'line', ADD drawing VARCHAR(120) NOT NULL DEFAULT ''`,
  );
  await knex.schema.alterTable('mark_answers', (t) => {
    t.enum('kind', ['answered', 'accepted', 'reopened', 'verified', 'carried'])
      .notNullable()
      .defaultTo('answered');
    // The check of a later revision in which a correction was verified or carried on.
    t.string('check_id', 36).references('checks.id');
  });
  await knex.raw('DROP TRIGGER checks_transition');
  await knex.raw(
    checksStay(
      'AND NEW.category = OLD.category AND NEW.blind = OLD.blind AND NEW.inputs_asked = OLD.inputs_asked AND NEW.standard_solution = OLD.standard_solution AND NEW.opened_at = OLD.opened_at',
    ),
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TRIGGER checks_transition');
  await knex.raw(checksStay(''));
  await knex.schema.alterTable('mark_answers', (t) => {
    t.dropForeign('check_id');
    t.dropColumns('kind', 'check_id');
  });
  await knex.schema.alterTable('marks', (t) => t.dropColumns('place', 'drawing'));
  await knex.schema.alterTable('checks', (t) =>
    t.dropColumns('standard_solution', 'inputs_asked', 'blind', 'declaration'),
  );
  await knex.schema.alterTable('people', (t) => t.dropColumn('organisation'));
}
