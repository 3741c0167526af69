// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { revisionById } from '@/db/queries/revisions';
import { insertDraft, newestDraft } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { makers, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { requireWriter } from './require-writer';
import { type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({ revisionId: z.string().max(36) });

/** Makes the inputs of a frozen revision the newest draft of its sheet. The draft before it stays in the history. */
export async function restoreRevision(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ jobId: string; sheetId: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { officeId, personId } = actor;
  const r = await revisionById(database(), officeId, parsed.data.revisionId);
  if (!r) throw new NotFound(`revision ${parsed.data.revisionId}`);
  const body = draftSchema.parse(r.inputs);
  return inTransaction(actor, async (trx, record) => {
    await jobOpenToWork(trx, officeId, r.job_id);
    await requireSeen(trx, actor, [r.sheet_id]);
    await requireWriter(trx, actor, r.sheet_id);
    const newest = await newestDraft(trx, officeId, r.sheet_id, true);
    if (!newest) throw new NotFound(`draft of ${r.sheet_id}`);
    const version = newest.version + 1;
    await insertDraft(trx, { sheetId: r.sheet_id, officeId, version, body, by: personId, at: new Date() });
    const subject = `${sheetName(r.sheet_number)} revision ${r.number} as draft ${version}`;
    await record('went back to', subject, { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id });
    return { jobId: r.job_id, sheetId: r.sheet_id };
  });
}
