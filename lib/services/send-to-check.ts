// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { insertCheck } from '@/db/queries/checks';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { revisionById } from '@/db/queries/revisions';
import { env } from '@/lib/env';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

/** Categories 0 to 3 of independence as in BS 5975 and CG 300: standard, another member, not involved, another organisation. */
const input = z.object({
  revisionId: z.string().max(36),
  checkerId: z.string().min(1, 'Choose who checks.').max(36),
  category: z.coerce.number().int().min(0).max(3),
});

/** Gives a frozen revision to a checker who is not its originator. */
export async function sendToCheck(actor: Actor, raw: unknown): Promise<Result<{ checkId: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { revisionId, checkerId, category } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<{ checkId: string }>> => {
      const r = await revisionById(trx, actor.officeId, revisionId);
      const checker = (await peopleOf(trx, actor.officeId)).find((p) => p.id === checkerId);
      if (!r) throw new NotFound(`revision ${revisionId}`);
      const name = `${sheetName(r.sheet_number)} revision ${r.number}`;
      const refuse = async (path: string, message: string) => {
        await record('could not send to check', name);
        return mend(path, message);
      };
      if (!checker?.roles.includes('checker'))
        return refuse('checkerId', 'This person is not a checker of the office.');
      if (checker.id === r.originator_id)
        return refuse('checkerId', 'The checker of a sheet is never its originator.');
      if (r.check_id) return refuse('', 'This revision is with a checker already.');
      const id = randomUUID();
      await insertCheck(trx, {
        id,
        office_id: actor.officeId,
        revision_id: r.id,
        checker_id: checker.id,
        category,
        state: 'open',
        note: '',
        opened_at: new Date(),
        closed_at: null,
      });
      await queueMail(trx, {
        officeId: actor.officeId,
        recipient: checker.email,
        subject: `To check: ${name}, ${r.title}`,
        body: `${checker.name},\n\n${actor.name} asks you to check ${name}, ${r.title}, category ${category}:\n\n${env().appUrl}/jobs/${r.job_id}/checks/${id}\n`,
      });
      await record('sent to check', `${name} to ${checker.name}, category ${category}`, r.digest);
      return done({ checkId: id });
    },
  );
}
