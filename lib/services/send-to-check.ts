// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { isDuplicate } from '@/db/is-duplicate';
import { insertCheck } from '@/db/queries/checks';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { nextRevision, revisionById } from '@/db/queries/revisions';
import { env } from '@/lib/env';
import { categoryWords } from '@/lib/model/independence';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { requireIndependence } from './require-independence';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  revisionId: z.string().max(36),
  checkerId: z.string().min(1, 'Choose who checks.').max(36),
  /** Of independence, as in lib/model/independence.ts. */
  category: z.coerce.number().int().min(0).max(3),
  standardSolution: z.string().trim().max(200).default(''),
  inputsAsked: z.boolean().default(false),
  /** Whether the checker works without the sheet; categories 2 and 3 always do. */
  blind: z.boolean().default(false),
});

const already = 'This revision is with a checker already.';

/** Gives the newest revision of a sheet to a checker whom the category of independence admits. */
export async function sendToCheck(actor: Actor, raw: unknown): Promise<Result<{ checkId: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { revisionId, checkerId, category, standardSolution, inputsAsked, blind } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const r = await revisionById(trx, officeId, revisionId);
    if (!r) throw new NotFound(`revision ${revisionId}`);
    await jobOpenToWork(trx, officeId, r.job_id);
    const checker = (await peopleOf(trx, officeId)).find((p) => p.id === checkerId);
    if (!checker?.roles.includes('checker') || Number(checker.active) !== 1)
      refuse('not-a-checker', 'checkerId', 'This person is not a checker of the office.');
    await requireIndependence(trx, checker, r, { category, standardSolution });
    if (r.check_id) refuse('with-a-checker', '', already);
    if ((await nextRevision(trx, officeId, r.sheet_id)) !== r.number + 1)
      refuse('superseded', '', 'There is a newer revision of this sheet. Send that one.');
    const id = randomUUID();
    await insertCheck(trx, {
      id,
      office_id: officeId,
      revision_id: r.id,
      checker_id: checker.id,
      category,
      standard_solution: category === 0 ? standardSolution : '',
      inputs_asked: inputsAsked ? 1 : 0,
      blind: blind || category >= 2 ? 1 : 0,
      declaration: '',
      state: 'open',
      note: '',
      opened_at: new Date(),
      closed_at: null,
    }).catch((error: unknown) => {
      if (isDuplicate(error)) refuse('with-a-checker', '', already);
      throw error;
    });
    const name = `${sheetName(r.sheet_number)} revision ${r.number}`;
    await queueMail(trx, {
      officeId,
      recipient: checker.email,
      subject: `To check: ${name}, ${r.title}`,
      body: `${checker.name},\n\n${actor.name} asks you to check ${name}, ${r.title}, ${categoryWords(category)}:\n\n${env().appUrl}/jobs/${r.job_id}/checks/${id}\n`,
    });
    const about = { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id };
    await record('sent to check', `${name} to ${checker.name}, category ${category}`, about);
    return { checkId: id };
  });
}
