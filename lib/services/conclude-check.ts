// server only
import { z } from 'zod';
import { checkById, closeCheck, type MarkRow, marksOf } from '@/db/queries/checks';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { revisionById } from '@/db/queries/revisions';
import { env } from '@/lib/env';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  checkId: z.string().max(36),
  outcome: z.enum(['agreed', 'returned']),
  note: z.string().trim().max(1000),
});
type Outcome = z.infer<typeof input>['outcome'];

/** The checker agrees the sheet or returns it, and its originator is told. A sheet with an open correction is not agreed. */
export async function concludeCheck(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, outcome, note } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker concludes a check');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed already.');
    requireGrounds(outcome, await marksOf(trx, officeId, checkId), note);
    await closeCheck(trx, officeId, checkId, outcome, note, new Date());
    const name = `${sheetName(r.sheet_number)} revision ${r.number}`;
    const originator = (await peopleOf(trx, officeId)).find((p) => p.id === r.originator_id);
    if (originator) {
      const said = note === '' ? '' : `\n\n${note}`;
      await queueMail(trx, {
        officeId,
        recipient: originator.email,
        subject: `${name}, ${r.title}: ${outcome}`,
        body: `${originator.name},\n\n${actor.name} ${outcome} ${name}, ${r.title}.${said}\n\n${env().appUrl}/jobs/${r.job_id}/checks/${checkId}\n`,
      });
    }
    await record(outcome, name, { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id });
    return null;
  });
}

function requireGrounds(outcome: Outcome, marks: MarkRow[], note: string): void {
  const open = marks.filter((m) => m.kind !== 'agrees' && m.answer === null).length;
  if (outcome === 'agreed' && open > 0) {
    const count = open === 1 ? 'One mark is' : `${open} marks are`;
    refuse('marks-open', '', `${count} not answered. Return the sheet, or wait for the answers.`);
  }
  if (outcome === 'returned' && note === '' && marks.every((m) => m.kind === 'agrees'))
    refuse('no-reason', 'note', 'Say why the sheet goes back.');
}
