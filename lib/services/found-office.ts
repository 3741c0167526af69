// server only
import { randomUUID } from 'node:crypto';
import { insertOffice } from '@/db/queries/offices';
import { insertPerson } from '@/db/queries/people';
import { inTransaction } from './in-transaction';
import type { Result } from './result';
import { sendToken } from './send-token';

/** Founds an office and invites its administrator by e-mail. Called by the seed of an empty database, by no screen. */
export async function foundOffice(office: {
  name: string;
  zone: string;
  administrator: { name: string; email: string };
}): Promise<Result<{ officeId: string; personId: string }>> {
  const officeId = randomUUID();
  const personId = randomUUID();
  const { name, email } = office.administrator;
  const initials = name
    .split(/\s+/)
    .map((word) => word.slice(0, 1).toUpperCase())
    .join('')
    .slice(0, 4);
  return inTransaction({ officeId, name, personId }, async (trx, record) => {
    await insertOffice(trx, { id: officeId, name: office.name, zone: office.zone });
    const address = email.toLowerCase();
    await insertPerson(trx, officeId, {
      id: personId,
      email: address,
      name,
      initials,
      roles: ['administrator'],
    });
    await sendToken(trx, { officeId, personId, email: address, name }, 'invitation', 72);
    await record('founded the office', office.name, { aboutId: officeId });
    return { officeId, personId };
  });
}
