// server only
import type { Knex } from 'knex';
import { queueMail } from '@/db/queries/mails';
import { insertOneTimeToken } from '@/db/queries/tokens';
import { env } from '@/lib/env';
import { newToken, tokenHash } from './token';

/** Mails a link that lets a person set a password, once, within the hours given. */
export async function sendToken(
  trx: Knex.Transaction,
  to: { officeId: string; personId: string; email: string; name: string },
  purpose: 'invitation' | 'password',
  hours: number,
): Promise<void> {
  const token = newToken();
  await insertOneTimeToken(trx, {
    id: tokenHash(token),
    office_id: to.officeId,
    person_id: to.personId,
    purpose,
    expires_at: new Date(Date.now() + hours * 3_600_000),
  });
  const place = purpose === 'invitation' ? 'invitation' : 'reset-password';
  const link = `${env().appUrl}/${place}/${token}`;
  const subject = purpose === 'invitation' ? 'Your place in the office' : 'A new password';
  const lead =
    purpose === 'invitation'
      ? 'You are invited to the calculations of your office.'
      : 'You asked for a new password.';
  await queueMail(trx, {
    officeId: to.officeId,
    recipient: to.email,
    subject,
    body: `${to.name},\n\n${lead} Open this page within ${hours} hours and choose a password:\n\n${link}\n\nIf you did not expect this, do nothing.\n`,
  });
}
