// server only
import { createHash } from 'node:crypto';
import type { JobRow } from '@/db/queries/jobs';
import type { RevisionLine } from '@/db/queries/revisions';
import { env } from '@/lib/env';
import { blocks } from '@/templates/block';
import { type CertifiedCheck, composeChecks } from '@/templates/compose-certificate';
import { type AnsweredComment, composeResponses } from '@/templates/compose-responses';
import { composeRevisions } from '@/templates/compose-revisions';
import type { PrintedPackage } from '@/templates/paper/package-print';
import { renderPackage } from '@/templates/paper/render-package';
import { dayIn } from './day-in';
import type { RevisionPast } from './package-history';
import { sheetName } from './sheet-state';
import { type EmbeddedPackage, packageFileName, packageForm } from './verification/embedded-package';

export interface PackageRequest {
  office: string;
  /** Time zone of the office: days on paper are its days. */
  zone: string;
  job: JobRow & { authority: string | null };
  purpose: string;
  submittal: number;
  /** The submittal that went out before, if one did. */
  previous?: number | undefined;
  date: Date;
  engineer: { name: string; initials: string };
  originators: { name: string; initials: string }[];
  checkers: { name: string; initials: string }[];
  /** Of each revision that was checked, in their order. */
  checks?: readonly CertifiedCheck[];
  /** Of each revision, in their order. */
  history: readonly RevisionPast[];
  /** Comments of the rounds before, with their answers. */
  comments?: readonly AnsweredComment[];
}

/** Prints frozen revisions as one package. Inputs, results and digests ride inside as a file, so that it can be proved. */
export async function printPackage(
  request: PackageRequest,
  revisions: readonly RevisionLine[],
): Promise<PrintedPackage> {
  const { office, job, purpose, submittal, date } = request;
  const day = (at: Date) => dayIn(request.zone, at);
  const data: EmbeddedPackage = {
    form: packageForm,
    job: { number: job.number, title: job.title },
    submittal,
    sheets: revisions.map((r) => ({
      sheet: sheetName(r.sheet_number),
      title: r.title,
      revision: r.number,
      digest: r.digest,
      engine: r.engine,
      inputs: r.inputs,
      results: r.results,
    })),
  };
  const bytes = new TextEncoder().encode(JSON.stringify(data));
  const digest = createHash('sha256')
    .update(revisions.map((r) => r.digest).join('\n'))
    .digest('hex');
  const checks = composeChecks(request.checks ?? []);
  return renderPackage({
    office,
    job: {
      number: job.number,
      title: job.title,
      place: job.place,
      authority: job.authority ?? undefined,
      codes: job.codes.split('\n').filter((line) => line.trim() !== ''),
    },
    purpose: `Submittal ${submittal}, ${purpose}`,
    submittal,
    previous: request.previous,
    mode: 'final',
    size: job.page_size,
    language: job.units === 'US' ? 'en-US' : 'en-GB',
    date,
    digest: shortDigest(digest),
    people: { originators: request.originators, checkers: request.checkers, engineer: request.engineer },
    sheets: revisions.map((r, i) => ({
      kind: 'calculated' as const,
      since: request.history[i]?.since,
      marks: Object.fromEntries(
        [...(request.history[i]?.changedIn ?? [])].map(([line, changedIn]) => [line, { changedIn }]),
      ),
      number: sheetName(r.sheet_number),
      title: r.title,
      blocks: blocks.parse(r.blocks),
      revision: r.number,
      originator: { initials: r.originator, date: day(r.frozen_at) },
      checker: r.checker && r.checked_at ? { initials: r.checker, date: day(r.checked_at) } : undefined,
      digest: shortDigest(r.digest),
    })),
    closing: [
      ...checks.blocks,
      ...composeResponses(request.comments ?? []),
      ...composeRevisions(
        revisions.map((r, i) => ({
          number: sheetName(r.sheet_number),
          revisions: (request.history[i]?.revisions ?? []).map((p) => ({ ...p, date: day(p.frozenAt) })),
        })),
      ),
    ],
    closingMarks: checks.marks,
    seal: { on: 'cover', covers: revisions.map((r) => sheetName(r.sheet_number)).join(', ') },
    verifyAt: `${env().appUrl}/verify`,
    data: { name: packageFileName, description: 'Inputs and results of every sheet', bytes },
  });
}

/** "5e1f 90c7": enough of a digest to tell two revisions apart on paper. */
export function shortDigest(digest: string): string {
  return `${digest.slice(0, 4)} ${digest.slice(4, 8)}`;
}
