// server only
import { z } from 'zod';
import { checkById } from '@/db/queries/checks';
import { insertOwnSheet, ownSheetOfCheck } from '@/db/queries/own-sheets';
import { revisionById } from '@/db/queries/revisions';
import { draft as draftSchema } from '@/lib/model/draft';
import { startingDraft } from '@/lib/model/starting-draft';
import type { Actor } from './actor';
import { writeSheet } from './create-sheet';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({ checkId: z.string().max(36) });

/**
 * The checker's own sheet of a blind check: empty but for the basis, the unit set and the kind of structure, so that
 * everything else is the checker's own.
 */
export async function beginOwnSheet(
  actor: Actor,
  raw: unknown,
): Promise<Result<{ sheetId: string; jobId: string }>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker derives a check');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    if (Number(check.blind) !== 1)
      refuse('not-blind', '', 'This check is done at the sheet; it needs no sheet of your own.');
    if (await ownSheetOfCheck(trx, officeId, checkId))
      refuse('begun-already', '', 'You have begun your own sheet already.');
    const theirs = draftSchema.parse(r.inputs);
    const title = `Check of ${sheetName(r.sheet_number)}: ${r.title}`.slice(0, 120);
    const draft = { ...startingDraft(theirs.geometry.shape, theirs.units, title), basis: theirs.basis };
    const sheet = { jobId: r.job_id, title, draft, verb: 'began a checker’s own sheet' };
    const sheetId = await writeSheet(trx, record, actor, sheet);
    await insertOwnSheet(trx, {
      check_id: checkId,
      office_id: officeId,
      sheet_id: sheetId,
      begun_at: new Date(),
    });
    return { sheetId, jobId: r.job_id };
  });
}
