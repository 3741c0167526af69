// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { voidChecksOfSheet } from '@/db/queries/checks';
import { touchJob } from '@/db/queries/jobs';
import { insertRevision, nextRevision } from '@/db/queries/revisions';
import { newestDraft, sheetById } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { makers, requireRole } from './require-role';
import { requireWriter } from './require-writer';
import { type Result, unread } from './result';
import { revisionDigest } from './revision-digest';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';
import { solveDraft } from './solve-draft';
import { storedResults } from './stored-results';
import { tellOfChange } from './tell-of-change';
import { voidSubmittalsOf } from './void-submittals';

const input = z.object({
  sheetId: z.string().max(36),
  reason: z.string().trim().min(3, 'Say in a few words what this revision is for.').max(500),
});

/**
 * Freezes the newest draft: inputs, results and written lines with the engine's version, bound by one digest. Checks of
 * earlier revisions and submittals that were not sent lose their force, and the people concerned are told. A draft that
 * does not solve, or fails one of its checks, is not frozen.
 */
export async function freezeSheet(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ revisionId: string; jobId: string }>> {
  requireRole(actor, ...makers, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { sheetId, reason } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const kept = await newestDraft(trx, officeId, sheetId, true);
    const sheet = await sheetById(trx, officeId, sheetId);
    if (!kept || !sheet) throw new NotFound(`sheet ${sheetId}`);
    await requireWriter(trx, actor, sheetId);
    const job = await jobOpenToWork(trx, officeId, sheet.job_id);
    const inputs = draftSchema.parse(kept.body);
    const { results, blocks, engine } = solveOrRefuse(inputs);
    const digest = revisionDigest({ inputs, results, blocks, engine });
    const number = await nextRevision(trx, officeId, sheetId);
    const name = `${sheetName(sheet.number)} revision ${number}`;
    const checkers = await voidChecksOfSheet(trx, officeId, sheetId);
    const submittals = await voidSubmittalsOf(trx, record, sheet, `${name} took its place`);
    const id = randomUUID();
    await insertRevision(trx, {
      id,
      office_id: officeId,
      sheet_id: sheetId,
      number,
      reason,
      inputs,
      results,
      blocks,
      engine,
      digest,
      originator_id: actor.personId,
      frozen_at: new Date(),
    });
    await tellOfChange(trx, actor, { job, sheet, name, reason, checkers, submittals });
    await touchJob(trx, officeId, sheet.job_id);
    await record('froze', name, { digest, jobId: sheet.job_id, aboutId: sheetId });
    return { revisionId: id, jobId: sheet.job_id };
  });
}

function solveOrRefuse(draft: ReturnType<typeof draftSchema.parse>) {
  const solved = solveDraft(draft);
  if (!solved.ok) {
    const [first] = solved.errors;
    refuse(
      solved.refusal?.code ?? 'draft-open',
      '',
      solved.refusal?.message ??
        `${solved.errors.length === 1 ? 'One field is' : `${solved.errors.length} fields are`} still open. ${first?.message ?? ''}`.trim(),
    );
  }
  const { solution, blocks } = solved;
  const results = storedResults(solution);
  return { results, blocks, engine: solution.engine };
}
