// server only
import { z } from 'zod';
import { lockPeople, changePerson as writePerson } from '@/db/queries/people';
import { type Actor, role } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { endAllSessions } from './session';

const input = z.object({
  personId: z.string().max(36),
  name: z.string().trim().min(2, 'Type the name as it is printed.').max(120),
  initials: z.string().trim().min(1, 'Type the initials.').max(4, 'At most four letters.'),
  roles: z.array(role).min(1, 'Choose at least one role.'),
  /** Another organisation that the person checks for; blank for the office's own, left as it is when absent. */
  organisation: z.string().trim().max(120).optional(),
  active: z.boolean(),
});

/** Changes a person's name, initials and roles, or closes their account; the person signs in anew. */
export async function changePerson(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { personId, ...change } = parsed.data;
  const result = await inTransaction(actor, async (trx, record) => {
    const people = await lockPeople(trx, actor.officeId);
    if (!people.some((p) => p.id === personId)) throw new NotFound(`person ${personId}`);
    const stays = change.active && change.roles.includes('administrator');
    const another = people.some(
      (p) => p.id !== personId && Number(p.active) === 1 && p.roles.includes('administrator'),
    );
    if (!stays && !another)
      refuse('last-administrator', 'roles', 'The office keeps at least one active administrator.');
    await writePerson(trx, actor.officeId, personId, change);
    const now = change.active ? change.roles.join(', ') : 'account closed';
    await record('changed a person', `${change.name}: ${now}`, { aboutId: personId });
    return null;
  });
  if (result.ok) await endAllSessions(personId);
  return result;
}
