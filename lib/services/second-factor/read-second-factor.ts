// server only
import { database } from '@/db/connection';
import { officeById } from '@/db/queries/offices';
import { countRecoveryCodes, secondFactorOf } from '@/db/queries/second-factors';
import type { Actor } from '../actor';
import { everyone, requireRole } from '../require-role';

/** Whether one's own second factor is on, how many recovery codes are left, and whether the office asks for it. */
export async function readSecondFactor(actor: Actor) {
  requireRole(actor, ...everyone);
  const { officeId, personId } = actor;
  const factor = await secondFactorOf(database(), officeId, personId);
  const office = await officeById(database(), officeId);
  return {
    on: Boolean(factor?.confirmed_at),
    codesLeft: await countRecoveryCodes(database(), officeId, personId),
    neededToSeal: Number(office?.seal_needs_second) === 1,
  };
}
