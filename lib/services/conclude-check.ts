// server only
import { z } from 'zod';
import { checkById, closeCheck, marksOf } from '@/db/queries/checks';
import { revisionById } from '@/db/queries/revisions';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotAllowed, NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  checkId: z.string().max(36),
  outcome: z.enum(['agreed', 'returned']),
  note: z.string().trim().max(1000),
});

/** The checker agrees the sheet or returns it. A sheet with an open correction is not agreed. */
export async function concludeCheck(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, outcome, note } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<null>> => {
      const check = await checkById(trx, actor.officeId, checkId, true);
      if (!check) throw new NotFound(`check ${checkId}`);
      if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker concludes a check');
      const r = await revisionById(trx, actor.officeId, check.revision_id);
      const name = r ? `${sheetName(r.sheet_number)} revision ${r.number}` : check.revision_id;
      const marks = await marksOf(trx, actor.officeId, checkId);
      const open = marks.filter((m) => m.kind !== 'agrees' && m.answer === null);
      const fault =
        check.state !== 'open'
          ? check.state === 'void'
            ? 'The sheet changed meanwhile: this check is void.'
            : 'This check is closed already.'
          : outcome === 'agreed' && open.length > 0
            ? `${open.length === 1 ? 'One mark is' : `${open.length} marks are`} not answered. Return the sheet, or wait for the answers.`
            : outcome === 'returned' && marks.every((m) => m.kind === 'agrees') && note === ''
              ? 'Say why the sheet goes back.'
              : undefined;
      if (fault) {
        await record('could not conclude the check', name);
        return mend('', fault);
      }
      await closeCheck(trx, actor.officeId, checkId, outcome, note, new Date());
      await record(outcome === 'agreed' ? 'agreed' : 'returned', name, r?.digest);
      return done(null);
    },
  );
}
