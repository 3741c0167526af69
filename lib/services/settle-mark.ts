// server only
import { z } from 'zod';
import { checkById, insertMarkStep, markById } from '@/db/queries/checks';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { markPlace } from './mark-state';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';

const input = z
  .object({
    markId: z.string().max(36),
    outcome: z.enum(['accepted', 'reopened']),
    text: z.string().trim().max(1000).default(''),
  })
  .refine((s) => s.outcome === 'accepted' || s.text !== '', {
    path: ['text'],
    message: 'Say what is still asked for.',
  });

/** The checker's back-check of an answer: accepted, or opened again with the reason. */
export async function settleMark(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { markId, outcome, text } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const found = await markById(trx, officeId, markId);
    if (!found) throw new NotFound(`mark ${markId}`);
    const check = await checkById(trx, officeId, found.check_id, true);
    const mark = await markById(trx, officeId, markId);
    if (!check || !mark) throw new NotFound(`mark ${markId}`);
    if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker settles a mark');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    if (mark.last_step !== 'answered') refuse('not-answered', '', 'There is no new answer to this mark.');
    await insertMarkStep(trx, {
      office_id: officeId,
      mark_id: markId,
      kind: outcome,
      text,
      person_id: actor.personId,
      check_id: null,
      at: new Date(),
    });
    const verb = outcome === 'accepted' ? 'accepted an answer' : 'opened a mark again';
    const words = [markPlace(mark), text].filter(Boolean).join(': ').slice(0, 400);
    await record(verb, words, { jobId: mark.job_id, aboutId: mark.sheet_id });
    return null;
  });
}
