// server only
import { z } from 'zod';
import { isDuplicate } from '@/db/is-duplicate';
import { checkById } from '@/db/queries/checks';
import { insertComparison, ownSheetOfCheck } from '@/db/queries/own-sheets';
import { revisionById, revisionsOfSheet } from '@/db/queries/revisions';
import { draft } from '@/lib/model/draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { pairValues, resultValues } from './result-values';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({ checkId: z.string().max(36) });

/**
 * Sets the values of the checker's own frozen sheet beside the designer's, by name, and keeps the comparison for good. From
 * then on the checker sees the designer's sheet.
 */
export async function compareOwnSheet(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const theirs = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !theirs) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker compares');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    const sheet = await ownSheetOfCheck(trx, officeId, checkId);
    const [own] = sheet ? await revisionsOfSheet(trx, officeId, sheet.sheet_id) : [];
    if (!own) refuse('not-frozen', '', 'Freeze your own sheet first; then the two are compared.');
    const pairs = pairValues(
      resultValues(theirs.results, draft.parse(theirs.inputs).units),
      resultValues(own.results, draft.parse(own.inputs).units),
    );
    await insertComparison(trx, {
      check_id: checkId,
      office_id: officeId,
      own_revision_id: own.id,
      pairs,
      at: new Date(),
    }).catch((error: unknown) => {
      if (isDuplicate(error)) refuse('compared-already', '', 'The two are compared already.');
      throw error;
    });
    const names = [theirs, own].map((r) => `${sheetName(r.sheet_number)} revision ${r.number}`);
    const about = { digest: own.digest, jobId: theirs.job_id, aboutId: theirs.sheet_id };
    await record('compared own sheet', names.join(' with '), about);
    return null;
  });
}
