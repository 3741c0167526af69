// server only
import { database } from '@/db/connection';
import { jobById } from '@/db/queries/jobs';
import { nextRevision, revisionsOfSheet } from '@/db/queries/revisions';
import { newestDraft, sheetById } from '@/db/queries/sheets';
import { draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

/** A sheet with its newest draft and its revisions. */
export async function openSheet(actor: Actor, sheetId: string) {
  requireRole(actor, ...everyone);
  const sheet = await sheetById(database(), actor.officeId, sheetId);
  const kept = await newestDraft(database(), actor.officeId, sheetId);
  const job = sheet && (await jobById(database(), actor.officeId, sheet.job_id));
  if (!sheet || !kept || !job) throw new NotFound(`sheet ${sheetId}`);
  await requireSeen(database(), actor, [sheetId]);
  const revisions = await revisionsOfSheet(database(), actor.officeId, sheetId);
  return {
    job: { id: job.id, number: job.number, title: job.title },
    sheet: {
      id: sheet.id,
      number: sheetName(sheet.number),
      title: sheet.title,
      nextRevision: await nextRevision(database(), actor.officeId, sheetId),
    },
    draft: draftSchema.parse(kept.body),
    version: kept.version,
    keptAt: kept.kept_at,
    revisions: revisions.map((r) => ({
      id: r.id,
      number: r.number,
      frozenAt: r.frozen_at,
      state: r.check_state,
    })),
  };
}
