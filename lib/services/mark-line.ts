// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { checkById, insertMark, removeMark } from '@/db/queries/checks';
import { revisionById } from '@/db/queries/revisions';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z
  .object({
    checkId: z.string().max(36),
    line: z.string().min(1).max(40),
    kind: z.enum(['agrees', 'correct', 'query']),
    text: z.string().trim().max(1000),
  })
  .refine((m) => m.kind === 'agrees' || m.text !== '', {
    path: ['text'],
    message: 'Say what is to be corrected, or what you ask.',
  });

/** The checker's mark at a line; a new one takes the place of the old. */
export async function markLine(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, line, kind, text } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker marks a sheet');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    await removeMark(trx, officeId, checkId, line);
    const id = randomUUID();
    await insertMark(trx, {
      id,
      office_id: officeId,
      check_id: checkId,
      line,
      kind,
      text,
      at: new Date(),
    });
    const where = `${sheetName(r.sheet_number)} revision ${r.number}, line ${line}`;
    const words = text === '' ? where : `${where}: ${text}`;
    const about = { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id };
    await record(`marked ${kind}`, words.slice(0, 400), about);
    return null;
  });
}
