// server only
import { database } from '@/db/connection';
import { authorityById, jobById } from '@/db/queries/jobs';
import {
  commentsOf,
  commentsOfJob,
  decisionOf,
  noteOpened,
  type ReviewLinkRow,
  reviewLink,
} from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { fileOf, submittalById } from '@/db/queries/submittals';
import { blocks } from '@/templates/block';
import { changesSince, sayChange } from './changes-since';
import { inTransaction } from './in-transaction';
import { allowAttempt } from './limit-attempts';
import { reviewer } from './reviewer';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';
import { tokenHash } from './token';
import { usualDecisions } from './usual-decisions';

export type ReviewDoor =
  | { open: true; link: ReviewLinkRow }
  | { open: false; why: 'unknown' | 'expired' | 'revoked' | 'too-often' };

const perQuarterHour = 600;

/** Whether a review link lets its holder in. */
export async function reviewDoor(token: string, from: string): Promise<ReviewDoor> {
  if (!(await allowAttempt(`review:${from}`, perQuarterHour))) return { open: false, why: 'too-often' };
  const link = await reviewLink(database(), tokenHash(token));
  if (!link) return { open: false, why: 'unknown' };
  if (link.revoked_at) return { open: false, why: 'revoked' };
  if (link.expires_at < new Date()) return { open: false, why: 'expired' };
  return { open: true, link };
}

/** What the reviewer reads. The first opening is recorded. */
export async function openReview(link: ReviewLinkRow) {
  const db = database();
  const submittal = await submittalById(db, link.office_id, link.submittal_id);
  const job = submittal && (await jobById(db, link.office_id, submittal.job_id));
  if (!submittal || !job) throw new NotFound('submittal of a link');
  if (!link.opened_at) {
    await inTransaction(reviewer(link), async (trx, record) => {
      // Of several that open it at the same instant the first is recorded.
      if ((await noteOpened(trx, link.id, new Date())) !== 1) refuse('opened', '', 'It was opened already.');
      const about = { jobId: job.id, aboutId: submittal.id };
      await record('opened the review', `${job.number} submittal ${submittal.number}`, about);
    });
  }
  const authority = job.authority_id ? await authorityById(db, link.office_id, job.authority_id) : undefined;
  const revisions = await revisionsOfSubmittal(db, link.office_id, link.submittal_id);
  const changes = await changesSince(db, submittal, revisions);
  const file = await fileOf(db, link.office_id, link.submittal_id, 'sealed');
  return {
    job: { number: job.number, title: job.title },
    submittal: {
      number: submittal.number,
      purpose: submittal.purpose,
      remarks: submittal.remarks,
      pages: submittal.pages,
    },
    sealed: file && { by: file.signed_by, at: file.made_at, sha256: file.sha256 },
    sheets: revisions.map((r) => ({
      revisionId: r.id,
      number: sheetName(r.sheet_number),
      title: r.title,
      revision: r.number,
      change: sayChange(changes, r.id),
      blocks: blocks.parse(r.blocks),
    })),
    comments: await commentsOf(db, link.office_id, link.submittal_id),
    decisions: authority?.decisions ?? usualDecisions,
    /** Comments on earlier submittals of the job, for the back-check. */
    earlier: (await commentsOfJob(db, link.office_id, job.id)).filter((c) => c.submittal < submittal.number),
    decision: await decisionOf(db, link.office_id, link.submittal_id),
  };
}

/** The sealed file, for the holder of a link. */
export async function readReviewFile(link: ReviewLinkRow): Promise<Buffer> {
  const file = await fileOf(database(), link.office_id, link.submittal_id, 'sealed');
  if (!file) throw new NotFound('sealed file');
  return file.bytes;
}
