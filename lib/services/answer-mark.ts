// server only
import { z } from 'zod';
import { answerMark as writeAnswer } from '@/db/queries/checks';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({
  markId: z.string().max(36),
  answer: z.string().trim().min(1, 'An answer is missing.').max(1000),
});

/** The originator's answer to a mark. */
export async function answerMark(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
    const found = await writeAnswer(trx, actor.officeId, parsed.data.markId, parsed.data.answer);
    if (found !== 1) throw new NotFound(`mark ${parsed.data.markId}`);
    await record('answered a mark', parsed.data.markId);
  });
  return done(null);
}
