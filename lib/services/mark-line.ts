// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { checkById, insertMark, type MarkRow, marksOf, removeMark } from '@/db/queries/checks';
import { type RevisionLine, revisionById } from '@/db/queries/revisions';
import { draft } from '@/lib/model/draft';
import { listInputs } from '@/lib/model/list-inputs';
import { blocks } from '@/templates/block';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { isHidden } from './require-seen';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z
  .object({
    checkId: z.string().max(36),
    place: z.enum(['line', 'input', 'basis']).default('line'),
    line: z.string().min(1).max(250),
    drawing: z.string().trim().max(120).default(''),
    kind: z.enum(['agrees', 'correct', 'query']),
    text: z.string().trim().max(1000),
  })
  .refine((m) => m.kind === 'agrees' || m.text !== '', {
    path: ['text'],
    message: 'Say what is to be corrected, or what you ask.',
  })
  .refine((m) => m.place !== 'basis' || m.kind === 'query', {
    path: ['kind'],
    message: 'The basis is asked about; lines and inputs are marked.',
  })
  .refine((m) => m.place !== 'input' || m.kind !== 'agrees' || m.drawing !== '', {
    path: ['drawing'],
    message: 'Name the drawing that this input agrees with.',
  });

/**
 * The checker's mark at a line, a figure or an input; a new one takes the place of the old. An input agrees with a drawing
 * that is named. A mark that was answered stands, so that nothing said about it is lost.
 */
export async function markLine(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, line, place, kind, text, drawing } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker marks a sheet');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    if (place !== 'basis' && (await isHidden(trx, actor, [r.sheet_id])))
      refuse('not-compared', '', 'Compare your own sheet first. Until then, ask about the basis.');
    requirePlace(r, place, line);
    const there = (await marksOf(trx, officeId, checkId)).find((m) => m.place === place && m.line === line);
    if (there?.last_step)
      refuse('mark-answered', 'text', 'This mark was answered. Accept the answer or open the mark again.');
    await removeMark(trx, officeId, { check_id: checkId, place, line });
    const id = randomUUID();
    await insertMark(trx, {
      id,
      office_id: officeId,
      check_id: checkId,
      line,
      place,
      kind,
      text,
      drawing: place === 'input' ? drawing : '',
      at: new Date(),
    });
    const where = `${sheetName(r.sheet_number)} revision ${r.number}, ${place === 'line' ? `line ${line}` : line}`;
    const words = [where, drawing, text].filter(Boolean).join(': ');
    const about = { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id };
    await record(`marked ${kind}`, words.slice(0, 400), about);
    return null;
  });
}

function requirePlace(r: RevisionLine, place: MarkRow['place'], line: string): void {
  if (place === 'basis') return;
  const there =
    place === 'line'
      ? blocks.parse(r.blocks).some((b) => b.id === line)
      : listInputs(draft.parse(r.inputs)).some((i) => i.place === line);
  if (!there) refuse('no-such-place', 'line', `This sheet has no ${place} "${line}".`);
}
