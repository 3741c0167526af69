// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { isDuplicate } from '@/db/is-duplicate';
import { insertPerson, personByEmail } from '@/db/queries/people';
import { type Actor, role } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { mend, type Result, unread } from './result';
import { sendToken } from './send-token';
import { refuse } from './service-error';

const input = z.object({
  email: z.email('Type an e-mail address.').max(190).toLowerCase(),
  name: z.string().trim().min(2, 'Type the name as it is printed.').max(120),
  initials: z.string().trim().min(1, 'Type the initials.').max(4, 'At most four letters.'),
  roles: z.array(role).min(1, 'Choose at least one role.'),
});

const taken = 'There is a person with this address already.';

/** Invites a person into the office by e-mail. */
export async function invitePerson(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const person = { id: randomUUID(), ...parsed.data };
  if (await personByEmail(database(), person.email)) return mend('address-taken', 'email', taken);
  return inTransaction(actor, async (trx, record) => {
    await insertPerson(trx, actor.officeId, person).catch((error: unknown) => {
      if (isDuplicate(error)) refuse('address-taken', 'email', taken);
      throw error;
    });
    const to = {
      officeId: actor.officeId,
      personId: person.id,
      email: person.email,
      name: person.name,
    };
    await sendToken(trx, to, 'invitation', 72);
    await record('invited', `${person.name}, ${person.email}`, { aboutId: person.id });
    return null;
  });
}
