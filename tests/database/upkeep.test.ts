import knex from 'knex';
import { afterAll, describe, expect, it } from 'vitest';
import { connectionSettings, database } from '@/db/connection';
import { deleteExpired } from '@/db/queries/expired';
import { env } from '@/lib/env';
import { verifyAllOffices } from '@/lib/services/night-worker';
import { readAudit } from '@/lib/services/read-audit';
import { walkAudit } from '@/lib/services/verify-audit';
import { fillRecord } from './fill-record';
import { makeJob, makeOffice } from './office-factory';

afterAll(() => database().destroy());

const toldAs = 'The record of the office does not hold together';

describe('the record of an office', () => {
  it('holds together after a whole job', async () => {
    const { office } = await fillRecord();
    const report = await walkAudit(office.id);
    expect(report.entries).toBeGreaterThan(12);
    expect(report.broken).toBeUndefined();
  });

  it('is walked once a day, and shows what was found', async () => {
    const office = await makeOffice();
    await makeJob(office);
    const night = new Date('2031-02-01T02:00:00Z');
    expect(await verifyAllOffices(night)).not.toContain(office.id);
    await makeJob(office, '26-002');
    await verifyAllOffices(new Date('2031-02-01T22:00:00Z'));
    const { walked } = await readAudit(office.people.engineer, {});
    expect(walked).toEqual({ at: night, entries: 1, broken: null });
    await database()('record_walks').where({ day: '2031-02-01' }).delete();
  });

  it.each([
    ['an entry is changed', 'UPDATE audit SET subject = "other" WHERE office_id = ? AND verb = "froze"'],
    ['an entry is taken out', 'DELETE FROM audit WHERE office_id = ? AND verb = "sealed"'],
    ['the last entry is taken off', 'DELETE FROM audit WHERE office_id = ? ORDER BY id DESC LIMIT 1'],
  ])('is found broken when %s', async (_what, sql) => {
    const { office } = await fillRecord();
    const { officeId } = office.people.engineer;
    await withoutRules(() => database().raw(sql, [officeId]));
    expect((await walkAudit(officeId)).broken).toBeDefined();
    const night = new Date('2031-03-01T02:00:00Z');
    const both = await Promise.all([verifyAllOffices(night), verifyAllOffices(night)]);
    expect(both.flat().filter((id) => id === officeId)).toHaveLength(1);
    await database()('record_walks').where({ day: '2031-03-01' }).delete();
    const mails = await database()('mails').where({ office_id: officeId, subject: toldAs });
    expect(mails.map((m) => m.recipient)).toEqual([office.people.administrator.email]);
    expect(mails[0]?.body).toContain('Keep the database as it is');
  });
});

/** Someone with the keys of the database takes its rules off, does something, and puts them back. */
async function withoutRules(work: () => Promise<unknown>): Promise<void> {
  const [[update]] = await database().raw('SHOW CREATE TRIGGER audit_no_update');
  const [[remove]] = await database().raw('SHOW CREATE TRIGGER audit_no_delete');
  await database().raw('DROP TRIGGER audit_no_update');
  await database().raw('DROP TRIGGER audit_no_delete');
  await work();
  for (const t of [update, remove])
    await database().raw(String(t['SQL Original Statement']).replace(/DEFINER=\S+ /, ''));
}

describe('clearing what has expired', () => {
  it('takes old tries, sessions, tokens and prepared seals, and nothing else', async () => {
    const office = await makeOffice();
    await makeJob(office);
    const { engineer } = office.people;
    const now = new Date();
    const session = (id: string, days: number) => ({
      id,
      user_id: engineer.personId,
      office_id: office.id,
      expires_at: new Date(now.getTime() + days * 86_400_000),
    });
    await database()('sessions').insert([session('old', -1), session('good', 1)]);
    await database()('attempts').insert([
      { subject: 'old', at: new Date(now.getTime() - 2 * 86_400_000) },
      { subject: 'new', at: now },
    ]);
    expect(await deleteExpired(database(), now)).toBeGreaterThanOrEqual(2);
    expect(await database()('sessions').where({ office_id: office.id }).pluck('id')).toEqual(['good']);
    expect(await database()('attempts').whereIn('subject', ['old', 'new']).pluck('subject')).toEqual(['new']);
    expect(await deleteExpired(database(), now)).toBe(0);
  });
});

describe('migrations', () => {
  it('go all the way down and up again', async () => {
    const url = new URL(env().databaseUrl);
    url.pathname = `${url.pathname}_down`;
    await database().raw('CREATE DATABASE ??', [url.pathname.slice(1)]);
    const db = knex(connectionSettings(url.href));
    const settings = { directory: './db/migrations', extension: 'ts' };
    const tables = async () => (await db.raw('SHOW TABLES'))[0].length;
    try {
      await db.migrate.latest(settings);
      const full = await tables();
      expect(full).toBeGreaterThan(25);
      await db.migrate.rollback(settings, true);
      expect(await tables()).toBe(2);
      await db.migrate.latest(settings);
      expect(await tables()).toBe(full);
    } finally {
      await db.raw('DROP DATABASE ??', [url.pathname.slice(1)]);
      await db.destroy();
    }
  }, 60_000);
});
