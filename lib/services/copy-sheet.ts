// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { newestDraft, sheetById } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { addSheet } from './create-sheet';
import { makers, requireRole } from './require-role';
import { done, type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ sheetId: z.string().max(36) });

/** A copy of a sheet in the same job, with a number of its own. */
export async function copySheet(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { sheetId } = parsed.data;
  const sheet = await sheetById(database(), actor.officeId, sheetId);
  const kept = await newestDraft(database(), actor.officeId, sheetId);
  if (!sheet || !kept) throw new NotFound(`sheet ${sheetId}`);
  const title = `${sheet.title}, copy`.slice(0, 120);
  const draft = { ...draftSchema.parse(kept.body), title };
  return done({ id: await addSheet(actor, sheet.job_id, title, draft, 'copied sheet') });
}
