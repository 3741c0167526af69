import type { Knex } from 'knex';
import { env } from '../../lib/env';
import { foundOffice } from '../../lib/services/found-office';
import { Unusable } from '../../lib/unusable';
import { anyOffice } from '../queries/offices';

/** The first office of an empty database, from the settings; its administrator is invited by mail. */
export async function seed(knex: Knex): Promise<void> {
  if (await anyOffice(knex)) return;
  const { officeName, officeZone, administratorName, administratorEmail } = env();
  if (!officeName || !administratorName || !administratorEmail)
    throw new Unusable(
      'The database has no office yet. Set OFFICE_NAME, ADMINISTRATOR_NAME and ADMINISTRATOR_EMAIL (and OFFICE_ZONE), and start again.',
    );
  const founded = await foundOffice({
    name: officeName,
    zone: officeZone,
    administrator: { name: administratorName, email: administratorEmail },
  });
  if (!founded.ok) throw new Error(founded.errors.map((e) => e.message).join(' '));
}
