// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { jobById } from '@/db/queries/jobs';
import { type RevisionLine, revisionById, revisionsOfSheet } from '@/db/queries/revisions';
import { compareDrafts } from '@/lib/model/compare-drafts';
import { draft } from '@/lib/model/draft';
import { blocks } from '@/templates/block';
import { compareBlocks } from '@/templates/compare-blocks';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';
import { pairValues, resultValues } from './result-values';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({
  revisionId: z.string().max(36),
  /** Number of the earlier revision; the one before when it is left out. */
  with: z.coerce.number().int().min(0).optional().catch(undefined),
});

/** Two revisions of one sheet side by side: inputs in words, results value by value, lines. */
export async function compareRevisions(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const { revisionId, with: asked } = input.parse(raw);
  const db = database();
  const later = await revisionById(db, actor.officeId, revisionId);
  const job = later && (await jobById(db, actor.officeId, later.job_id));
  if (!later || !job) throw new NotFound(`revision ${revisionId}`);
  await requireSeen(db, actor, [later.sheet_id]);
  const earlier = (await revisionsOfSheet(db, actor.officeId, later.sheet_id)).filter(
    (r) => r.number < later.number,
  );
  const before = asked === undefined ? earlier[0] : earlier.find((r) => r.number === asked);
  if (!before) throw new NotFound(`a revision before ${later.number}`);
  const [inputsBefore, inputsAfter] = [draft.parse(before.inputs), draft.parse(later.inputs)];
  return {
    job: { id: job.id, number: job.number, title: job.title },
    sheet: { id: later.sheet_id, number: sheetName(later.sheet_number), title: later.title },
    before: facts(before),
    after: facts(later),
    others: earlier.map((r) => r.number),
    inputs: compareDrafts(inputsBefore, inputsAfter),
    values: pairValues(
      resultValues(before.results, inputsBefore.units),
      resultValues(later.results, inputsAfter.units),
    ),
    lines: compareBlocks(blocks.parse(before.blocks), blocks.parse(later.blocks)),
  };
}

function facts(r: RevisionLine) {
  return {
    id: r.id,
    number: r.number,
    reason: r.reason,
    frozenAt: r.frozen_at,
    originator: r.originator_name,
  };
}
