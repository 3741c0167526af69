// server only
import { database } from '@/db/connection';
import { checkById, marksOf } from '@/db/queries/checks';
import { jobById } from '@/db/queries/jobs';
import { peopleOf } from '@/db/queries/people';
import { revisionById, revisionsOfSheet } from '@/db/queries/revisions';
import { blocks } from '@/templates/block';
import { lastChanged } from '@/templates/last-changed';
import type { Actor } from './actor';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

/** A frozen revision as it stands on the page, with its check and marks, and who could check it. */
export async function readRevision(
  { officeId, personId }: Pick<Actor, 'officeId' | 'personId'>,
  revisionId: string,
) {
  const db = database();
  const r = await revisionById(db, officeId, revisionId);
  const job = r && (await jobById(db, officeId, r.job_id));
  if (!r || !job) throw new NotFound(`revision ${revisionId}`);
  const check = r.check_id ? await checkById(db, officeId, r.check_id) : undefined;
  const people = await peopleOf(db, officeId);
  const all = await revisionsOfSheet(db, officeId, r.sheet_id);
  const past = all.filter((o) => o.number <= r.number);
  const newest = all.find((o) => o.number > r.number);
  return {
    job: { id: job.id, number: job.number, title: job.title },
    revision: {
      id: r.id,
      sheetId: r.sheet_id,
      sheet: sheetName(r.sheet_number),
      title: r.title,
      number: r.number,
      reason: r.reason,
      digest: r.digest,
      engine: r.engine,
      frozenAt: r.frozen_at,
      originator: r.originator_name,
      originatorId: r.originator_id,
    },
    /** The newest revision, when this one is no longer it: checks and unsent seals of this one are void. */
    newer: newest && {
      id: newest.id,
      number: newest.number,
      reason: newest.reason,
      frozenAt: newest.frozen_at,
      originator: newest.originator_name,
    },
    blocks: blocks.parse(r.blocks),
    /** Lines that changed after the first revision, each with the revision in which it last did. */
    changedIn: [
      ...lastChanged(past.reverse().map((p) => ({ number: p.number, blocks: blocks.parse(p.blocks) }))),
    ],
    check: check && {
      id: check.id,
      state: check.state,
      category: check.category,
      note: check.note,
      mine: check.checker_id === personId,
      checker: people.find((p) => p.id === check.checker_id)?.name,
      closedAt: check.closed_at,
    },
    marks: check ? await marksOf(db, officeId, check.id) : [],
    checkers: people
      .filter((p) => p.roles.includes('checker') && p.id !== r.originator_id && Number(p.active) === 1)
      .map((p) => ({ id: p.id, name: p.name })),
  };
}
