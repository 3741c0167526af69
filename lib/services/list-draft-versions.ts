// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { draftVersions, sheetById } from '@/db/queries/sheets';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { NotFound } from './service-error';

const input = z.object({
  sheetId: z.string().max(36),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});

const size = 50;

/** The history of a draft, newest first: version, when and by whom it was kept. */
export async function listDraftVersions(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const { sheetId, page } = input.parse(raw);
  if (!(await sheetById(database(), actor.officeId, sheetId))) throw new NotFound(`sheet ${sheetId}`);
  await requireSeen(database(), actor, [sheetId]);
  const at = { size, offset: (page - 1) * size };
  const rows = await draftVersions(database(), actor.officeId, sheetId, at);
  return rows.map((r) => ({ version: r.version, keptAt: r.kept_at, by: r.name }));
}
