// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { checkById, insertMark, removeMark } from '@/db/queries/checks';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotAllowed, NotFound } from './service-error';

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
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<null>> => {
      const check = await checkById(trx, actor.officeId, checkId, true);
      if (!check) throw new NotFound(`check ${checkId}`);
      if (check.checker_id !== actor.personId) throw new NotAllowed('only its checker marks a sheet');
      if (check.state !== 'open') {
        await record('could not mark', `line ${line}`);
        return mend(
          '',
          check.state === 'void'
            ? 'The sheet changed meanwhile: this check is void.'
            : 'This check is closed.',
        );
      }
      await removeMark(trx, actor.officeId, checkId, line);
      await insertMark(trx, {
        id: randomUUID(),
        office_id: actor.officeId,
        check_id: checkId,
        line,
        kind,
        text,
        answer: null,
        at: new Date(),
      });
      await record(`marked ${kind}`, `line ${line} of check ${checkId}`);
      return done(null);
    },
  );
}
