// server only
import { database } from '@/db/connection';
import { jobById, jobPeople } from '@/db/queries/jobs';
import { sheetLines } from '@/db/queries/sheets';
import { submittalsOf } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';
import { sheetName, sheetState } from './sheet-state';

/** One job with its sheets and submittals. */
export async function openJob(actor: Actor, jobId: string) {
  requireRole(actor, ...everyone);
  const job = await jobById(database(), actor.officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  const [sheets, submittals, people] = await Promise.all([
    sheetLines(database(), actor.officeId, [jobId]),
    submittalsOf(database(), actor.officeId, jobId),
    jobPeople(database(), actor.officeId, jobId),
  ]);
  return {
    job: {
      id: job.id,
      number: job.number,
      title: job.title,
      place: job.place,
      jurisdiction: job.jurisdiction,
      units: job.units,
      pageSize: job.page_size,
      authority: job.authority,
      authorityId: job.authority_id,
      codes: job.codes,
      state: job.state,
    },
    people: people.map((p) => ({ personId: p.person_id, part: p.part, name: p.name, initials: p.initials })),
    sheets: sheets.map((s) => ({
      id: s.id,
      number: sheetName(s.number),
      title: s.title,
      state: sheetState(s),
      revision: s.revision,
      revisionId: s.revision_id,
      originator: s.originator,
      checker: s.checker,
      checkId: s.check_id,
      checkState: s.check_state,
      changedAt: s.changed_at,
    })),
    submittals: submittals.map((s) => ({
      id: s.id,
      number: s.number,
      state: s.state,
      createdAt: s.created_at,
      voidReason: s.void_reason,
      decision: s.decision,
    })),
  };
}
