// server only
import { createHash, randomUUID } from 'node:crypto';
import { z } from 'zod';
import { voidChecksOfSheet } from '@/db/queries/checks';
import { touchJob } from '@/db/queries/jobs';
import { insertRevision, nextRevision } from '@/db/queries/revisions';
import { newestDraft, sheetById } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';
import { solveDraft } from './solve-draft';

const input = z.object({
  sheetId: z.string().max(36),
  reason: z.string().trim().min(3, 'Say in a few words what this revision is for.').max(500),
});

/**
 * Freezes the newest draft: inputs, results and written lines with the engine's version, bound by one digest. Checks of
 * earlier revisions lose their force. A draft that does not solve, or fails one of its checks, is not frozen.
 */
export async function freezeSheet(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ revisionId: string; jobId: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { sheetId, reason } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<{ revisionId: string; jobId: string }>> => {
      const kept = await newestDraft(trx, actor.officeId, sheetId, true);
      const sheet = await sheetById(trx, actor.officeId, sheetId);
      if (!kept || !sheet) throw new NotFound(`sheet ${sheetId}`);
      const name = sheetName(sheet.number);
      const inputs = draftSchema.parse(kept.body);
      const solved = solveDraft(inputs);
      if (!solved.ok) {
        await record('could not freeze', name);
        return mend(
          '',
          solved.refusal?.message ??
            `${solved.errors.length} fields are still open. ${solved.errors[0]?.message ?? ''}`,
        );
      }
      const { solution, blocks } = solved;
      const results = {
        reactions: solution.cases,
        X: solution.X,
        checks: solution.checks,
        envelopes: solution.envelopes,
      };
      const digest = createHash('sha256')
        .update(JSON.stringify([inputs, results, blocks, solution.engine]))
        .digest('hex');
      const number = await nextRevision(trx, actor.officeId, sheetId);
      const id = randomUUID();
      await voidChecksOfSheet(trx, actor.officeId, sheetId);
      await insertRevision(trx, {
        id,
        office_id: actor.officeId,
        sheet_id: sheetId,
        number,
        reason,
        inputs,
        results,
        blocks,
        engine: solution.engine,
        digest,
        originator_id: actor.personId,
        frozen_at: new Date(),
      });
      await touchJob(trx, actor.officeId, sheet.job_id);
      await record('froze', `${name} revision ${number}`, digest);
      return done({ revisionId: id, jobId: sheet.job_id });
    },
  );
}
