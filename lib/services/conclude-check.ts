// server only
import type { Knex } from 'knex';
import { z } from 'zod';
import {
  type CheckRow,
  checkById,
  closeCheck,
  type MarkRow,
  marksOf,
  unsettledBefore,
} from '@/db/queries/checks';
import { queueMail } from '@/db/queries/mails';
import { comparisonOf } from '@/db/queries/own-sheets';
import { peopleOf } from '@/db/queries/people';
import { type RevisionLine, revisionById } from '@/db/queries/revisions';
import { env } from '@/lib/env';
import { draft } from '@/lib/model/draft';
import { declarationWords, needsDeclaration } from '@/lib/model/independence';
import { listInputs } from '@/lib/model/list-inputs';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { isSettled, markState } from './mark-state';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  checkId: z.string().max(36),
  outcome: z.enum(['agreed', 'returned']),
  note: z.string().trim().max(1000),
  /** The checker's declaration, which categories 2 and 3 ask for. */
  declared: z.boolean().default(false),
});

/** The checker agrees the sheet or returns it, and its originator is told. A sheet with something open is not agreed. */
export async function concludeCheck(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, outcome, note, declared } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker concludes a check');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed already.');
    const marks = await marksOf(trx, officeId, checkId);
    if (outcome === 'agreed') await requireComplete(trx, check, r, marks, declared);
    else requireReason(marks, note);
    const declaration = declared && needsDeclaration(check.category) ? declarationWords : '';
    await closeCheck(trx, officeId, checkId, outcome, { note, declaration, at: new Date() });
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

/** What must be done before a sheet is agreed: marks settled, earlier corrections verified, inputs held, declaration made. */
async function requireComplete(
  trx: Knex,
  check: CheckRow,
  r: RevisionLine,
  marks: readonly MarkRow[],
  declared: boolean,
): Promise<void> {
  const open = marks.filter((m) => !isSettled(markState(m.kind, m.last_step))).length;
  if (open > 0)
    refuse(
      'marks-open',
      '',
      `${open === 1 ? 'One mark is' : `${open} marks are`} not settled. Accept the answers, or return the sheet.`,
    );
  const before = (await unsettledBefore(trx, r.office_id, r.sheet_id, r.number)).length;
  if (before > 0)
    refuse(
      'not-verified',
      '',
      `${before === 1 ? 'One mark' : `${before} marks`} of an earlier revision ${before === 1 ? 'is' : 'are'} not verified.`,
    );
  if (Number(check.inputs_asked) === 1) {
    const held = new Set(marks.filter((m) => m.place === 'input').map((m) => m.line));
    const left = listInputs(draft.parse(r.inputs)).filter((i) => !held.has(i.place)).length;
    if (left > 0)
      refuse(
        'inputs-open',
        '',
        `${left === 1 ? 'One input is' : `${left} inputs are`} not held against a drawing yet.`,
      );
  }
  if (Number(check.blind) === 1 && !(await comparisonOf(trx, r.office_id, check.id)))
    refuse('not-compared', '', 'Compare your own sheet with the designer’s first.');
  if (needsDeclaration(check.category) && !declared)
    refuse('not-declared', 'declared', `Category ${check.category} asks for your declaration.`);
}

function requireReason(marks: readonly MarkRow[], note: string): void {
  if (note === '' && marks.every((m) => m.kind === 'agrees'))
    refuse('no-reason', 'note', 'Say why the sheet goes back.');
}
