// server only
import { z } from 'zod';
import { insertMarkStep, markById } from '@/db/queries/checks';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { isSettled, markPlace, markState } from './mark-state';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';

const input = z.object({
  markId: z.string().max(36),
  answer: z.string().trim().min(1, 'An answer is missing.').max(1000),
});

/** The answer to a mark of a check; answers are added, none takes the place of another. */
export async function answerMark(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { markId, answer } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const mark = await markById(trx, actor.officeId, markId);
    if (!mark) throw new NotFound(`mark ${markId}`);
    if (mark.check_state === 'void')
      refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (mark.kind === 'agrees' || isSettled(markState(mark.kind, mark.last_step)))
      refuse('mark-settled', '', 'This mark is settled.');
    await insertMarkStep(trx, {
      office_id: actor.officeId,
      mark_id: markId,
      kind: 'answered',
      text: answer,
      person_id: actor.personId,
      check_id: null,
      at: new Date(),
    });
    const about = { jobId: mark.job_id, aboutId: mark.check_id };
    await record('answered a mark', `${markPlace(mark)}: ${answer}`.slice(0, 400), about);
    return null;
  });
}
