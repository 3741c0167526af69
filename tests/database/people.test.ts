import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { changePerson } from '@/lib/services/change-person';
import { issueApiToken } from '@/lib/services/issue-api-token';
import { keepAuthority } from '@/lib/services/keep-authority';
import { openOffice } from '@/lib/services/open-office';
import { readApiToken } from '@/lib/services/read-api-token';
import { revokeApiToken } from '@/lib/services/revoke-api-token';
import { readSession } from '@/lib/services/session';
import { signIn } from '@/lib/services/sign-in';
import { tokenHash } from '@/lib/services/token';
import { makeOffice, need, type Office, password } from './office-factory';

afterAll(() => database().destroy());

let office: Office;
beforeEach(async () => {
  office = await makeOffice();
});

const from = () => `test-${Math.random()}`;

describe('an account', () => {
  it('is closed by the administrator: its sessions and tokens end and it cannot sign in', async () => {
    const { administrator, engineer } = office.people;
    const { token } = need(await signIn({ email: engineer.email, password }, from()));
    const api = need(await issueApiToken(engineer, { name: 'a program', days: 30 }));
    const closed = { personId: engineer.personId, name: 'Eno Gin', initials: 'EG', roles: ['engineer'] };
    need(await changePerson(administrator, { ...closed, active: false }));
    expect(await readSession(token)).toBeUndefined();
    expect(await readApiToken(api.token)).toBeUndefined();
    expect((await signIn({ email: engineer.email, password }, from())).ok).toBe(false);
  });

  it('has its new roles at once', async () => {
    const { administrator, engineer } = office.people;
    const change = { personId: engineer.personId, name: 'Eno Gin', initials: 'EG', active: true };
    need(await changePerson(administrator, { ...change, roles: ['checker'] }));
    const { token } = need(await signIn({ email: engineer.email, password }, from()));
    expect((await readSession(token))?.roles).toEqual(['checker']);
  });

  it('of the last administrator keeps that role, also when two lay it down at once', async () => {
    const { administrator, engineer } = office.people;
    const own = { personId: administrator.personId, name: 'Ada Min', initials: 'AM' };
    const leaving = { ...own, roles: ['engineer'], active: true };
    expect(await changePerson(administrator, leaving)).toMatchObject({
      ok: false,
      errors: [{ code: 'last-administrator', path: 'roles' }],
    });
    expect((await changePerson(administrator, { ...own, roles: ['administrator'], active: false })).ok).toBe(
      false,
    );
    const other = { personId: engineer.personId, name: 'Eno Gin', initials: 'EG' };
    need(await changePerson(administrator, { ...other, roles: ['administrator'], active: true }));
    const both = await Promise.all([
      changePerson(administrator, leaving),
      changePerson(administrator, { ...other, roles: ['engineer'], active: true }),
    ]);
    expect(both.filter((b) => b.ok)).toHaveLength(1);
  });
});

describe('signing in', () => {
  it('many times with the right password is never too often', async () => {
    const { engineer } = office.people;
    for (let i = 0; i < 12; i++) need(await signIn({ email: engineer.email, password }, from()));
  });
});

describe('a token for programs', () => {
  it('stands for its engineer, is kept as a hash, and can be revoked by nobody else', async () => {
    const { engineer, engineerOfRecord } = office.people;
    const { token } = need(await issueApiToken(engineer, { name: 'a program', days: 30 }));
    expect((await readApiToken(token))?.personId).toBe(engineer.personId);
    expect(await database()('api_tokens').where({ id: token })).toEqual([]);
    const id = tokenHash(token);
    await expect(revokeApiToken(engineerOfRecord, { id })).rejects.toThrow();
    need(await revokeApiToken(engineer, { id }));
    expect(await readApiToken(token)).toBeUndefined();
  });

  it('ends on its day', async () => {
    const { token } = need(await issueApiToken(office.people.engineer, { name: 'short', days: 1 }));
    await database()('api_tokens')
      .where({ id: tokenHash(token) })
      .update({ expires_at: new Date(Date.now() - 1000) });
    expect(await readApiToken(token)).toBeUndefined();
  });
});

describe('an authority', () => {
  it('is kept with its own words for decisions, each once', async () => {
    const { administrator } = office.people;
    const words = { name: 'County Board', decisions: ['No Exceptions Taken', 'Rejected'] };
    const { id } = need(await keepAuthority(administrator, words));
    need(await keepAuthority(administrator, { ...words, authorityId: id, decisions: ['Reviewed'] }));
    const kept = (await openOffice(administrator)).authorities.find((a) => a.id === id);
    expect(kept?.decisions).toEqual(['Reviewed']);
    expect(kept).toMatchObject({ wish: 'link', checklist: [] });
    const asks = { wish: 'attachment', checklist: ['Cover signed', 'Index complete'] };
    need(await keepAuthority(administrator, { ...words, authorityId: id, ...asks }));
    expect((await openOffice(administrator)).authorities.find((a) => a.id === id)).toMatchObject(asks);
    expect((await keepAuthority(administrator, { ...words, decisions: ['Yes', 'Yes'] })).ok).toBe(false);
  });
});
