// server only
import { z } from 'zod';
import { newestDraft, sheetById } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { writeSheet } from './create-sheet';
import { inTransaction } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { makers, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ sheetId: z.string().max(36) });

/** A copy of a sheet in the same job, with a number of its own. */
export async function copySheet(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { sheetId } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const sheet = await sheetById(trx, actor.officeId, sheetId);
    const kept = await newestDraft(trx, actor.officeId, sheetId);
    if (!sheet || !kept) throw new NotFound(`sheet ${sheetId}`);
    await requireSeen(trx, actor, [sheetId]);
    await jobOpenToWork(trx, actor.officeId, sheet.job_id);
    const title = `${sheet.title.slice(0, 113)}, copy`;
    const draft = { ...draftSchema.parse(kept.body), title };
    const copy = { jobId: sheet.job_id, title, draft, verb: 'copied sheet' };
    return { id: await writeSheet(trx, record, actor, copy) };
  });
}
