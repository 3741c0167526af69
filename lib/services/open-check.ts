// server only
import { database } from '@/db/connection';
import { checkById, type MarkRow, markStepsOf, unsettledBefore } from '@/db/queries/checks';
import { revisionById } from '@/db/queries/revisions';
import { draft } from '@/lib/model/draft';
import { listInputs } from '@/lib/model/list-inputs';
import type { Actor } from './actor';
import { markPlace, markState } from './mark-state';
import { openRevision } from './open-revision';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';

/**
 * A check with the revision it is of: its marks with every step they took, what earlier revisions left open, and the inputs
 * to be held against drawings.
 */
export async function openCheck(actor: Actor, checkId: string) {
  requireRole(actor, ...everyone);
  const db = database();
  const { officeId } = actor;
  const row = await checkById(db, officeId, checkId);
  const r = row && (await revisionById(db, officeId, row.revision_id));
  if (!row || !r) throw new NotFound(`check ${checkId}`);
  const { check: opened, marks, ...revision } = await openRevision(actor, row.revision_id);
  if (!opened) throw new NotFound(`check ${checkId}`);
  const steps = await markStepsOf(db, officeId, checkId);
  const before = await unsettledBefore(db, officeId, r.sheet_id, r.number);
  return {
    ...revision,
    check: {
      ...opened,
      standardSolution: row.standard_solution,
      inputsAsked: Number(row.inputs_asked) === 1,
      declaration: row.declaration,
      openedAt: row.opened_at,
    },
    marks: marks.map((m) => ({
      id: m.id,
      line: m.line,
      place: m.place,
      where: markPlace(m),
      kind: m.kind,
      text: m.text,
      drawing: m.drawing,
      at: m.at,
      state: markState(m.kind, m.last_step),
      steps: steps
        .filter((s) => s.mark_id === m.id)
        .map((s) => ({ kind: s.kind, text: s.text, by: s.name, at: s.at })),
    })),
    earlier: before.map((m) => ({
      id: m.id,
      where: markPlace(m),
      revision: m.revision,
      kind: m.kind,
      text: m.text,
    })),
    inputs: listInputs(draft.parse(r.inputs)).map((i) => ({ ...i, mark: atInput(marks, i.place) })),
  };
}

function atInput(marks: readonly MarkRow[], place: string) {
  const mark = marks.find((m) => m.place === 'input' && m.line === place);
  return mark && { kind: mark.kind, text: mark.text, drawing: mark.drawing };
}
