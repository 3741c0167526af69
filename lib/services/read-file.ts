// server only
import { database } from '@/db/connection';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { fileOf, preparedSealById } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { NotFound } from './service-error';

/** The file of a submittal as it stands: sealed when it is sealed. */
export async function readSubmittalFile(actor: Actor, submittalId: string): Promise<Buffer> {
  requireRole(actor, ...everyone);
  const db = database();
  const file =
    (await fileOf(db, actor.officeId, submittalId, 'sealed')) ??
    (await fileOf(db, actor.officeId, submittalId, 'unsigned'));
  if (!file) throw new NotFound(`file of ${submittalId}`);
  const revisions = await revisionsOfSubmittal(db, actor.officeId, submittalId);
  await requireSeen(
    db,
    actor,
    revisions.map((r) => r.sheet_id),
  );
  return file.bytes;
}

/** The bytes prepared for a seal, for the browser of the person they were prepared for. */
export async function readPreparedFile(actor: Actor, preparedId: string): Promise<Buffer> {
  requireRole(actor, 'engineer-of-record');
  const prepared = await preparedSealById(database(), actor.officeId, preparedId);
  if (!prepared || prepared.person_id !== actor.personId || prepared.expires_at < new Date())
    throw new NotFound(`prepared ${preparedId}`);
  return prepared.bytes;
}
