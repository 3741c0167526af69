// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { jobById, takeNumber, touchJob } from '@/db/queries/jobs';
import { insertDraft, insertSheet } from '@/db/queries/sheets';
import type { Draft } from '@/lib/model/draft';
import { startingDraft, startingSheets } from '@/lib/model/starting-draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  jobId: z.string().max(36),
  start: z.enum(startingSheets),
  title: z.string().trim().min(1, 'A sheet needs a title.').max(120),
});

/** A new sheet from a starting sheet; its number is never used again. */
export async function createSheet(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, start, title } = parsed.data;
  const job = await jobById(database(), actor.officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  return done({
    id: await addSheet(actor, jobId, title, startingDraft(start, job.units, title), 'made sheet'),
  });
}

/** Numbers and keeps a sheet with its first draft. */
export async function addSheet(
  actor: Actor,
  jobId: string,
  title: string,
  draft: Draft,
  verb: string,
): Promise<string> {
  const id = randomUUID();
  await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
    const number = await takeNumber(trx, actor.officeId, jobId, 'next_sheet');
    if (number === undefined) throw new NotFound(`job ${jobId}`);
    const at = new Date();
    await insertSheet(trx, {
      id,
      office_id: actor.officeId,
      job_id: jobId,
      number,
      title,
      originator_id: actor.personId,
      changed_at: at,
    });
    await insertDraft(trx, {
      sheetId: id,
      officeId: actor.officeId,
      version: 1,
      body: draft,
      by: actor.personId,
      at,
    });
    await touchJob(trx, actor.officeId, jobId);
    await record(verb, `${sheetName(number)} ${title}`);
  });
  return id;
}
