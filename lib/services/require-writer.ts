// server only
import type { Knex } from 'knex';
import { checkOfOwnSheet } from '@/db/queries/own-sheets';
import type { Actor } from './actor';
import { makers } from './require-role';
import { NotAllowed } from './service-error';

/** Who writes in a sheet: engineers; in a sheet that a checker made for a check, that checker alone while it is open. */
export async function requireWriter(trx: Knex, actor: Actor, sheetId: string): Promise<void> {
  const own = await checkOfOwnSheet(trx, actor.officeId, sheetId);
  if (own) {
    if (own.checker_id !== actor.personId) throw new NotAllowed('only its checker writes in this sheet');
    if (own.check_state !== 'open') throw new NotAllowed('the check that this sheet was made for is closed');
    return;
  }
  if (!actor.roles.some((r) => makers.includes(r)))
    throw new NotAllowed(`${actor.initials} writes in no sheet but one made for a check`);
}
