// server only
import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { z } from 'zod';
import { takeNumber, touchJob } from '@/db/queries/jobs';
import { insertDraft, insertSheet } from '@/db/queries/sheets';
import type { Draft } from '@/lib/model/draft';
import { startSheet } from '@/lib/model/start-sheet';
import { startingChoice } from '@/lib/model/starting-choice';
import type { Actor } from './actor';
import { inTransaction, type Record } from './in-transaction';
import { jobOpenToWork } from './job-open-to-work';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

const input = z.intersection(
  z.object({
    jobId: z.string().max(36),
    title: z.string().trim().min(1, 'A sheet needs a title.').max(120),
  }),
  startingChoice,
);

/** A new sheet from a starting sheet; its number is never used again. */
export async function createSheet(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, title } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const job = await jobOpenToWork(trx, actor.officeId, jobId);
    const started = startSheet(parsed.data, job.units, title);
    if (!started.ok) {
      const [first] = started.errors;
      refuse('size', first?.path ?? '', first?.message ?? 'A size cannot be read.');
    }
    const sheet = { jobId, title, draft: started.draft, verb: 'made sheet' };
    return { id: await writeSheet(trx, record, actor, sheet) };
  });
}

/** Makes a sheet of a given draft, such as one of the demo. */
export async function addSheet(
  actor: Actor,
  jobId: string,
  title: string,
  draft: Draft,
  verb: string,
): Promise<string> {
  requireRole(actor, ...makers);
  const added = await inTransaction(actor, async (trx, record) => {
    await jobOpenToWork(trx, actor.officeId, jobId);
    return writeSheet(trx, record, actor, { jobId, title, draft, verb });
  });
  if (!added.ok) throw new Error(added.errors.map((e) => e.message).join(' '));
  return added.value;
}

/** Numbers and keeps a sheet with its first draft. */
export async function writeSheet(
  trx: Knex.Transaction,
  record: Record,
  actor: Actor,
  sheet: { jobId: string; title: string; draft: Draft; verb: string },
): Promise<string> {
  const { jobId, title, draft, verb } = sheet;
  const { officeId, personId } = actor;
  const id = randomUUID();
  const number = await takeNumber(trx, officeId, jobId, 'next_sheet');
  if (number === undefined) throw new NotFound(`job ${jobId}`);
  const at = new Date();
  await insertSheet(trx, {
    id,
    office_id: officeId,
    job_id: jobId,
    number,
    title,
    originator_id: personId,
    changed_at: at,
  });
  await insertDraft(trx, { sheetId: id, officeId, version: 1, body: draft, by: personId, at });
  await touchJob(trx, officeId, jobId);
  await record(verb, `${sheetName(number)} ${title}`, { jobId, aboutId: id });
  return id;
}
