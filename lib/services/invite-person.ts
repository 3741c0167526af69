// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { insertPerson, personByEmail } from '@/db/queries/people';
import { type Actor, role } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { sendToken } from './send-token';

const input = z.object({
  email: z.email('Type an e-mail address.').max(190).toLowerCase(),
  name: z.string().trim().min(2, 'Type the name as it is printed.').max(120),
  initials: z.string().trim().min(1, 'Type the initials.').max(4, 'At most four letters.'),
  roles: z.array(role).min(1, 'Choose at least one role.'),
});

/** Invites a person into the office by e-mail. */
export async function invitePerson(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const person = { id: randomUUID(), ...parsed.data };
  if (await personByEmail(database(), person.email))
    return mend('email', 'There is a person with this address already.');
  await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
    await insertPerson(trx, actor.officeId, person);
    await sendToken(
      trx,
      { officeId: actor.officeId, personId: person.id, email: person.email, name: person.name },
      'invitation',
      72,
    );
    await record('invited', person.email);
  });
  return done(null);
}
