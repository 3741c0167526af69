// server only
import { database } from '@/db/connection';
import { personWithOffice } from '@/db/queries/people';
import { type Actor, role } from './actor';

/** An active person as the one who acts. */
export async function actorById(personId: string): Promise<Actor | undefined> {
  const row = await personWithOffice(database(), personId);
  if (!row || Number(row.active) !== 1) return undefined;
  return {
    personId: row.id,
    officeId: row.office_id,
    officeName: row.office_name,
    zone: row.zone,
    roles: role.array().parse(row.roles),
    name: row.name,
    initials: row.initials,
    email: row.email,
  };
}
