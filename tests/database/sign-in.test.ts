import { afterAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { acceptInvitation } from '@/lib/services/accept-invitation';
import { askPasswordReset } from '@/lib/services/ask-password-reset';
import { changePassword } from '@/lib/services/change-password';
import { invitePerson } from '@/lib/services/invite-person';
import { NotAllowed } from '@/lib/services/service-error';
import { endSession, readSession } from '@/lib/services/session';
import { signIn } from '@/lib/services/sign-in';
import { signOutEverywhere } from '@/lib/services/sign-out-everywhere';
import { makeOffice, need, password } from './office-factory';

afterAll(() => database().destroy());

const from = () => `test-${Math.random()}`;

/** The link in the newest mail to an address. */
async function linkTo(email: string): Promise<string> {
  const [mail] = await database()('mails').where({ recipient: email }).orderBy('next_try', 'desc');
  return /\/(?:invitation|reset-password)\/(\S+)/.exec(mail.body)?.[1] as string;
}

describe('signing in', () => {
  it('opens a session whose token is not in the database', async () => {
    const { engineer } = (await makeOffice()).people;
    const { token } = need(await signIn({ email: engineer.email, password }, from()));
    expect(await database()('sessions').where({ id: token })).toEqual([]);
    expect((await readSession(token))?.personId).toBe(engineer.personId);
    await endSession(token);
    expect(await readSession(token)).toBeUndefined();
  });

  it('answers a wrong password and an unknown address alike', async () => {
    const { engineer } = (await makeOffice()).people;
    const wrong = await signIn({ email: engineer.email, password: 'wrong' }, from());
    const unknown = await signIn({ email: 'nobody@nowhere.example', password: 'wrong' }, from());
    expect(wrong.ok).toBe(false);
    expect(wrong).toEqual(unknown);
  });

  it('stops after eight tries, whatever the password is then', async () => {
    const { engineer } = (await makeOffice()).people;
    for (let i = 0; i < 8; i++) await signIn({ email: engineer.email, password: 'wrong' }, from());
    const late = await signIn({ email: engineer.email, password }, from());
    expect(!late.ok && late.errors[0]?.message).toMatch(/quarter of an hour/);
  });

  it('ends everywhere at once', async () => {
    const { checker } = (await makeOffice()).people;
    const one = need(await signIn({ email: checker.email, password }, from()));
    const two = need(await signIn({ email: checker.email, password }, from()));
    await signOutEverywhere(checker);
    expect(await readSession(one.token)).toBeUndefined();
    expect(await readSession(two.token)).toBeUndefined();
  });
});

describe('an invitation', () => {
  it('lets a person choose a password once', async () => {
    const { administrator } = (await makeOffice()).people;
    const email = `new-${Math.random()}@office.example`;
    need(
      await invitePerson(administrator, { email, name: 'New Person', initials: 'NP', roles: ['engineer'] }),
    );
    const token = await linkTo(email);
    expect((await acceptInvitation({ token, password: 'short' })).ok).toBe(false);
    need(await acceptInvitation({ token, password: 'twelve letters' }));
    expect((await acceptInvitation({ token, password: 'twelve letters' })).ok).toBe(false);
    expect((await signIn({ email, password: 'twelve letters' }, from())).ok).toBe(true);
  });

  it('is sent by an administrator alone', async () => {
    const { engineer } = (await makeOffice()).people;
    await expect(invitePerson(engineer, {})).rejects.toBeInstanceOf(NotAllowed);
  });
});

describe('a forgotten password', () => {
  it('is answered the same for an address nobody has', async () => {
    const { engineer } = (await makeOffice()).people;
    const known = await askPasswordReset({ email: engineer.email }, from());
    const unknown = await askPasswordReset({ email: 'nobody@nowhere.example' }, from());
    expect(known).toEqual(unknown);
    expect(await linkTo(engineer.email)).toBeTruthy();
  });
});

describe('changing one’s own password', () => {
  it('asks for the one in use, and changes nothing without it', async () => {
    const { checker } = (await makeOffice()).people;
    const refused = await changePassword(checker, { current: 'not it', password: 'a new long password' });
    expect(!refused.ok && refused.errors[0]?.path).toBe('current');
    expect((await signIn({ email: checker.email, password }, from())).ok).toBe(true);
  });

  it('ends every session, and only the new one opens the door', async () => {
    const { checker } = (await makeOffice()).people;
    const { token } = need(await signIn({ email: checker.email, password }, from()));
    need(await changePassword(checker, { current: password, password: 'a new long password' }));
    expect(await readSession(token)).toBeUndefined();
    expect((await signIn({ email: checker.email, password }, from())).ok).toBe(false);
    expect((await signIn({ email: checker.email, password: 'a new long password' }, from())).ok).toBe(true);
  });
});
