// server only
import { database } from '@/db/connection';
import { authorityById, jobById } from '@/db/queries/jobs';
import { mailsOfSubmittal } from '@/db/queries/mails';
import { licencesOf } from '@/db/queries/people';
import { commentsOf, decisionOf, reviewLinksOf } from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { fileOf, submittalById, transmittalsOf } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { blockingComments, sayBlocking } from './blocking-comments';
import { changesSince, sayChange } from './changes-since';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

/** A submittal with its sheets, file, seal, delivery, comments and decision. */
export async function openSubmittal(actor: Actor, id: string) {
  requireRole(actor, ...everyone);
  const db = database();
  const { officeId } = actor;
  const submittal = await submittalById(db, officeId, id);
  const job = submittal && (await jobById(db, officeId, submittal.job_id));
  if (!submittal || !job) throw new NotFound(`submittal ${id}`);
  const file = (await fileOf(db, officeId, id, 'sealed')) ?? (await fileOf(db, officeId, id, 'unsigned'));
  if (!file) throw new Error(`submittal ${id} has no file`);
  const revisions = await revisionsOfSubmittal(db, officeId, id);
  const changes = await changesSince(db, submittal, revisions);
  const authority = job.authority_id ? await authorityById(db, officeId, job.authority_id) : undefined;
  const mine = (await licencesOf(db, officeId))
    .filter((l) => l.person_id === actor.personId && l.jurisdiction === job.jurisdiction)
    .toSorted((a, b) => b.expires.getTime() - a.expires.getTime())[0];
  return {
    job: { id: job.id, number: job.number, title: job.title, jurisdiction: job.jurisdiction },
    submittal: {
      id,
      number: submittal.number,
      state: submittal.state,
      purpose: submittal.purpose,
      remarks: submittal.remarks,
      pages: submittal.pages,
      createdAt: submittal.created_at,
      voidReason: submittal.void_reason,
      /** Whether the actor is the engineer of record named on its cover. */
      mine: submittal.engineer_id === actor.personId,
    },
    sheets: revisions.map((r) => ({
      revisionId: r.id,
      number: sheetName(r.sheet_number),
      title: r.title,
      revision: r.number,
      digest: r.digest,
      originator: r.originator,
      checker: r.checker,
      checkedAt: r.checked_at,
      /** Flagged when it is new or changed since the last submittal that was sent. */
      change: sayChange(changes, r.id),
    })),
    leftOut: changes.leftOut.map((r) => `${sheetName(r.sheet_number)} ${r.title}`),
    /** Why it cannot go out yet. */
    blocked: sayBlocking(await blockingComments(db, submittal)),
    file: {
      kind: file.kind,
      sha256: file.sha256,
      size: file.bytes.length,
      signedBy: file.signed_by,
      madeAt: file.made_at,
    },
    authority: authority && {
      name: authority.name,
      reviewer: authority.reviewer,
      email: authority.email,
      wish: authority.wish,
      checklist: authority.checklist,
    },
    licence: mine && {
      id: mine.id,
      number: mine.number,
      profession: mine.profession,
      jurisdiction: mine.jurisdiction,
      expires: mine.expires,
    },
    transmittals: await transmittalsOf(db, officeId, id),
    mails: await mailsOfSubmittal(db, officeId, id),
    links: (await reviewLinksOf(db, officeId, id)).map((l) => ({
      id: l.id,
      reviewer: l.reviewer,
      email: l.email,
      expiresAt: l.expires_at,
      revokedAt: l.revoked_at,
      openedAt: l.opened_at,
    })),
    comments: await commentsOf(db, officeId, id),
    decision: await decisionOf(db, officeId, id),
  };
}
