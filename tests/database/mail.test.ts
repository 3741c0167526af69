import type { AddressInfo } from 'node:net';
import { createServer, type Server } from 'node:net';
import { afterAll, afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { database } from '@/db/connection';
import { claimMail, type MailRow, queueMail, settleMail } from '@/db/queries/mails';
import { makeOffice } from './office-factory';

const settings = vi.hoisted(() => ({ smtpUrl: '' }));
vi.mock('@/lib/env', async (original) => {
  const real = await original<typeof import('@/lib/env')>();
  return { ...real, env: () => ({ ...real.env(), smtpUrl: settings.smtpUrl }) };
});

import { deliverMail } from '@/lib/services/deliver-mail';

afterAll(() => database().destroy());

const now = () => new Date();
const longAgo = () => new Date(Date.now() - 5 * 60_000);

let officeId: string;
beforeEach(async () => {
  await database()('mails').delete();
  officeId = (await makeOffice()).id;
});

const queue = (recipient: string) =>
  queueMail(database(), { officeId, recipient, subject: 'Subject', body: 'Body' });
const onlyMail = (): Promise<MailRow> => database()('mails').where({ office_id: officeId }).first();

describe('the mail queue', () => {
  it('gives each mail to one of four senders that work at once', async () => {
    for (let i = 0; i < 40; i++) await queue(`r${i}@x.example`);
    const sent: string[] = [];
    const worker = async () => {
      for (;;) {
        const mail = await claimMail(database(), now(), longAgo());
        if (!mail) return;
        sent.push(mail.recipient);
        await settleMail(database(), mail.id, mail.attempts, { state: 'accepted', words: '250 ok' });
      }
    };
    await Promise.all([worker(), worker(), worker(), worker()]);
    expect(sent).toHaveLength(40);
    expect(new Set(sent).size).toBe(40);
  });

  it('takes up again what a sender left half done, after five minutes and not before', async () => {
    await queue('r@x.example');
    const first = await claimMail(database(), now(), longAgo());
    expect(first?.attempts).toBe(1);
    expect(await claimMail(database(), now(), longAgo())).toBeUndefined();
    await database()('mails').update({ claimed_at: new Date(Date.now() - 6 * 60_000) });
    expect((await claimMail(database(), now(), longAgo()))?.attempts).toBe(2);
  });

  it('takes no word from a sender whose mail was taken over', async () => {
    await queue('r@x.example');
    const slow = (await claimMail(database(), now(), longAgo())) as MailRow;
    await database()('mails').update({ claimed_at: new Date(Date.now() - 6 * 60_000) });
    const next = (await claimMail(database(), now(), longAgo())) as MailRow;
    const refused = { state: 'refused' as const, words: 'late' };
    expect(await settleMail(database(), slow.id, slow.attempts, refused)).toBe(false);
    expect(await settleMail(database(), next.id, next.attempts, { state: 'accepted', words: 'ok' })).toBe(
      true,
    );
    expect((await onlyMail()).state).toBe('accepted');
  });
});

describe('delivering', () => {
  let server: Server;
  let seen: string;
  afterEach(() => server.close());

  /** A mail server that answers the letter itself with `reply`, or hangs up when there is none. */
  async function answering(reply: string | undefined): Promise<void> {
    seen = '';
    server = createServer((socket) => {
      socket.write('220 test\r\n');
      let data = false;
      socket.on('data', (part) => {
        const text = part.toString();
        if (data) {
          seen += text;
          if (!seen.endsWith('\r\n.\r\n')) return;
          data = false;
          if (reply === undefined) socket.destroy();
          else socket.write(`${reply}\r\n`);
        } else if (/^DATA/i.test(text)) {
          data = true;
          socket.write('354 go on\r\n');
        } else socket.write(/^QUIT/i.test(text) ? '221 bye\r\n' : '250 ok\r\n');
      });
      socket.on('error', () => socket.destroy());
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    settings.smtpUrl = `smtp://127.0.0.1:${(server.address() as AddressInfo).port}`;
  }

  it('notes the words of the server that took it, and says one Message-ID for one mail', async () => {
    await answering('250 2.0.0 queued as 4711');
    await queue('r@x.example');
    expect(await deliverMail()).toBe(true);
    const mail = await onlyMail();
    expect([mail.state, mail.server_words]).toEqual(['accepted', '250 2.0.0 queued as 4711']);
    expect(seen).toContain(`Message-ID: <${mail.id}@`);
    expect(await deliverMail()).toBe(false);
  });

  it('tries again later after a temporary refusal', async () => {
    await answering('451 4.7.1 greylisted, come back');
    await queue('r@x.example');
    await deliverMail();
    const mail = await onlyMail();
    expect([mail.state, mail.attempts]).toEqual(['queued', 1]);
    expect(mail.server_words).toContain('greylisted');
    const wait = mail.next_try.getTime() - Date.now();
    expect(wait).toBeGreaterThan(50_000);
    expect(wait).toBeLessThanOrEqual(60_000);
  });

  it('does not try again after a refusal for good', async () => {
    await answering('550 5.1.1 no such mailbox');
    await queue('r@x.example');
    await deliverMail();
    const mail = await onlyMail();
    expect([mail.state, mail.attempts]).toEqual(['refused', 1]);
    expect(mail.server_words).toContain('no such mailbox');
  });

  it('tries again when the connection drops after the letter, and keeps its Message-ID', async () => {
    await answering(undefined);
    await queue('r@x.example');
    await deliverMail();
    const { id, state } = await onlyMail();
    expect(state).toBe('queued');
    expect(seen).toContain(`Message-ID: <${id}@`);
  });

  it('gives up after five tries at a dead server, with its last words', async () => {
    server = createServer();
    settings.smtpUrl = 'smtp://127.0.0.1:1';
    await queue('r@x.example');
    for (let i = 0; i < 5; i++) {
      await database()('mails').update({ next_try: new Date(Date.now() - 1000) });
      await deliverMail();
    }
    const mail = await onlyMail();
    expect([mail.state, mail.attempts]).toEqual(['refused', 5]);
    expect(mail.server_words).toMatch(/ECONNREFUSED/);
  });
});
