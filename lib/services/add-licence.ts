// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { insertLicence, peopleOf } from '@/db/queries/people';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';

const input = z.object({
  personId: z.string().max(36),
  jurisdiction: z.string().trim().min(1, 'Which jurisdiction licensed this person?').max(80),
  profession: z.string().trim().min(2, 'Type the profession as it is on the licence.').max(80),
  number: z.string().trim().min(1, 'Type the number of the licence.').max(40),
  expires: z.iso.date('Type the last day it is in force, as 2028-06-30.'),
});

/** Enters a licence in the office's register. Only a licence in force for the job's jurisdiction seals. */
export async function addLicence(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { personId, expires, ...licence } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const person = (await peopleOf(trx, actor.officeId)).find((p) => p.id === personId);
    if (!person) throw new NotFound(`person ${personId}`);
    if (!person.roles.includes('engineer-of-record'))
      refuse('not-engineer-of-record', 'personId', 'Only an engineer of record needs a licence here.');
    const id = randomUUID();
    await insertLicence(trx, {
      id,
      office_id: actor.officeId,
      person_id: personId,
      ...licence,
      expires: new Date(expires),
    });
    const words = `${person.name}: ${licence.jurisdiction} ${licence.number}, in force to ${expires}`;
    await record('entered a licence', words, { aboutId: personId });
    return { id };
  });
}
