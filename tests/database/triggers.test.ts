import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { type Filled, fillRecord } from './fill-record';

let filled: Filled;
beforeAll(async () => {
  filled = await fillRecord();
}, 60_000);
afterAll(() => database().destroy());

const where = (table: string) => {
  if (table === 'submittal_revisions' || table === 'files') return { submittal_id: filled.sent.submittalId };
  if (table === 'mark_answers' || table === 'responses') return { office_id: filled.office.id };
  if (table === 'decisions') return { submittal_id: filled.sent.submittalId };
  return { office_id: filled.office.id };
};

/** Each table that is record, and a column to try to change. */
const frozen: [string, string][] = [
  ['revisions', 'reason'],
  ['files', 'sha256'],
  ['submittal_revisions', 'position'],
  ['transmittals', 'recipient'],
  ['decisions', 'words'],
  ['audit', 'verb'],
  ['drafts', 'version'],
  ['comments', 'text'],
  ['responses', 'text'],
];

describe('rows of the record', () => {
  it.each(frozen)('of %s cannot be changed', async (table, column) => {
    const rows = database()(table).where(where(table));
    expect((await rows.clone()).length).toBeGreaterThan(0);
    const value = column === 'position' || column === 'version' ? 99 : 'changed';
    await expect(rows.clone().update({ [column]: value })).rejects.toThrow('frozen');
  });

  it.each(frozen)('of %s cannot be deleted', async (table) => {
    await expect(database()(table).where(where(table)).delete()).rejects.toThrow(/frozen|cannot be deleted/);
  });

  it.each(['jobs', 'sheets', 'checks', 'submittals', 'review_links', 'people', 'licences'])(
    'of %s cannot be deleted',
    async (table) => {
      const rows = database()(table).where({ office_id: filled.office.id });
      expect((await rows.clone()).length).toBeGreaterThan(0);
      await expect(rows.clone().delete()).rejects.toThrow('cannot be deleted');
    },
  );

  it('keep the number of a sheet', async () => {
    const rows = database()('sheets').where({ office_id: filled.office.id });
    await expect(rows.update({ number: 77 })).rejects.toThrow('number of a sheet is frozen');
  });

  it('keep the marks of a closed check', async () => {
    const mark = { office_id: filled.office.id, check_id: filled.sent.checkId };
    await expect(database()('marks').where(mark).update({ text: 'changed' })).rejects.toThrow('closed check');
    await expect(database()('marks').where(mark).delete()).rejects.toThrow('closed check');
    const late = { ...mark, id: 'late', line: '1', kind: 'query', text: 'late', at: new Date() };
    await expect(database()('marks').insert(late)).rejects.toThrow('closed check');
  });
});

describe('states in the database', () => {
  const checkStates = ['open', 'agreed', 'returned', 'void'];
  const checkMoves = ['open→agreed', 'open→returned', 'open→void', 'agreed→void', 'returned→void'];
  const submittalStates = ['drafted', 'sealed', 'sent', 'decided', 'void'];
  const submittalMoves = ['drafted→sealed', 'drafted→void', 'sealed→sent', 'sealed→void', 'sent→decided'];

  /** Every pair of different states with whether the database lets a row go from one to the other. */
  async function movesOf(table: 'checks' | 'submittals', states: string[]): Promise<string[]> {
    const id = table === 'checks' ? filled.sent.checkId : filled.sent.submittalId;
    const allowed: string[] = [];
    for (const from of states) {
      for (const to of states.filter((s) => s !== from)) {
        const moved = await tryMove(table, id, from, to);
        if (moved) allowed.push(`${from}→${to}`);
      }
    }
    return allowed;
  }

  /** A copy of the row in state `from`, moved to `to` in a transaction that is undone. */
  async function tryMove(table: string, id: string, from: string, to: string): Promise<boolean> {
    const undo = new Error('undo');
    let moved = false;
    await database()
      .transaction(async (trx) => {
        const row = await trx(table).where({ id }).first();
        const copy = { ...row, id: 'copy', state: from };
        if (table === 'checks') copy.revision_id = filled.frozen.revisionId;
        else copy.number = 4711;
        await trx(table).insert(copy);
        moved = await trx(table)
          .where({ id: 'copy' })
          .update({ state: to })
          .then(
            () => true,
            () => false,
          );
        throw undo;
      })
      .catch((error: unknown) => {
        if (error !== undo) throw error;
      });
    return moved;
  }

  it('of a check follow only as agreed', async () => {
    expect(await movesOf('checks', checkStates)).toEqual(checkMoves);
  });

  it('of a submittal follow only as agreed', async () => {
    expect(await movesOf('submittals', submittalStates)).toEqual(submittalMoves);
  });
});
