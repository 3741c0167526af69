// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { draftByVersion } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { NotFound } from './service-error';

const input = z.object({ sheetId: z.string().max(36), version: z.coerce.number().int().min(1) });

/** One earlier version of a draft. To go back to it, keep it on top of the newest. */
export async function openDraftVersion(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const { sheetId, version } = input.parse(raw);
  const row = await draftByVersion(database(), actor.officeId, sheetId, version);
  if (!row) throw new NotFound(`version ${version} of sheet ${sheetId}`);
  await requireSeen(database(), actor, [sheetId]);
  return { version: row.version, keptAt: row.kept_at, by: row.name, draft: draftSchema.parse(row.body) };
}
