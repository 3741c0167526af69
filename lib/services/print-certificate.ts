// server only
import { database } from '@/db/connection';
import { checkById } from '@/db/queries/checks';
import { jobById } from '@/db/queries/jobs';
import { revisionById } from '@/db/queries/revisions';
import { composeCertificate } from '@/templates/compose-certificate';
import { renderSheet } from '@/templates/paper/render-sheet';
import type { Actor } from './actor';
import { certifiedCheck } from './certified-check';
import { dayIn } from './day-in';
import { shortDigest } from './print-package';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

/** The certificate of a check and its schedule of marks and queries as PDF, with the same bytes for the same record. */
export async function printCertificate(
  actor: Actor,
  checkId: string,
): Promise<{ name: string; bytes: Uint8Array }> {
  requireRole(actor, ...everyone);
  const db = database();
  const { officeId } = actor;
  const check = await checkById(db, officeId, checkId);
  const r = check && (await revisionById(db, officeId, check.revision_id));
  const job = r && (await jobById(db, officeId, r.job_id));
  if (!check || !r || !job) throw new NotFound(`check ${checkId}`);
  await requireSeen(db, actor, [r.sheet_id]);
  const certified = await certifiedCheck(db, actor, checkId);
  const { blocks, marks } = composeCertificate(certified);
  const sheet = sheetName(r.sheet_number);
  const date = (at: Date) => dayIn(actor.zone, at);
  const printed = await renderSheet({
    sheet: {
      number: 'check',
      unnumbered: true,
      title: `Check of ${sheet} revision ${r.number}`,
      blocks,
      marks,
      markedBy: r.checker ?? undefined,
    },
    imprint: {
      office: actor.officeName,
      job: job.number,
      issue: `${sheet} rev ${r.number}`,
      originator: { initials: r.originator, date: date(r.frozen_at) },
      ...(r.checker && check.closed_at && check.state === 'agreed'
        ? { checker: { initials: r.checker, date: date(check.closed_at) } }
        : {}),
      mode: check.state === 'agreed' ? 'final' : 'preliminary',
      digest: shortDigest(r.digest),
    },
    jobTitle: job.title,
    size: job.page_size,
    language: job.units === 'US' ? 'en-US' : 'en-GB',
    date: check.closed_at ?? check.opened_at,
  });
  return {
    name: `${job.number}-${sheet}-check-${r.number}.pdf`.replace(/[^\w.-]+/g, '-'),
    bytes: printed.bytes,
  };
}
