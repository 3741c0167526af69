import { afterAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { claimMail, queueMail, settleMail } from '@/db/queries/mails';
import { makeOffice } from './office-factory';

afterAll(() => database().destroy());

const now = () => new Date();
const longAgo = () => new Date(Date.now() - 5 * 60_000);

describe('the mail queue', () => {
  it('gives each mail to one of four senders that work at once', async () => {
    await database()('mails').delete();
    const office = await makeOffice();
    for (let i = 0; i < 40; i++) {
      await queueMail(database(), {
        officeId: office.id,
        recipient: `r${i}@x.example`,
        subject: 's',
        body: 'b',
      });
    }
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
    await database()('mails').delete();
    const office = await makeOffice();
    await queueMail(database(), { officeId: office.id, recipient: 'r@x.example', subject: 's', body: 'b' });
    const first = await claimMail(database(), now(), longAgo());
    expect(first?.attempts).toBe(1);
    expect(await claimMail(database(), now(), longAgo())).toBeUndefined();
    await database()('mails').update({ claimed_at: new Date(Date.now() - 6 * 60_000) });
    expect((await claimMail(database(), now(), longAgo()))?.attempts).toBe(2);
  });
});
