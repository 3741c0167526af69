// server only
import { database } from '@/db/connection';
import { checkById, type MarkRow, markStepsOf, unsettledBefore } from '@/db/queries/checks';
import { comparisonOf, ownSheetOfCheck } from '@/db/queries/own-sheets';
import { revisionById, revisionsOfSheet } from '@/db/queries/revisions';
import { draft } from '@/lib/model/draft';
import { listInputs } from '@/lib/model/list-inputs';
import type { Actor } from './actor';
import { markPlace, markState } from './mark-state';
import { readRevision } from './read-revision';
import { everyone, requireRole } from './require-role';
import { isHidden } from './require-seen';
import { type ValuePair, valuePair } from './result-values';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

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
  const { check: opened, marks, ...revision } = await readRevision(actor, row.revision_id);
  if (!opened) throw new NotFound(`check ${checkId}`);
  const steps = await markStepsOf(db, officeId, checkId);
  const hidden = await isHidden(db, actor, [r.sheet_id]);
  const before = await unsettledBefore(db, officeId, r.sheet_id, r.number);
  return {
    ...revision,
    ...(hidden ? { blocks: [], changedIn: [] } : {}),
    check: {
      ...opened,
      standardSolution: row.standard_solution,
      inputsAsked: Number(row.inputs_asked) === 1,
      declaration: row.declaration,
      blind: Number(row.blind) === 1,
      /** Whether the sheet is kept from the one who asks. */
      hidden,
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
    own: await ownSheet(officeId, checkId),
    basis: draft.parse(r.inputs).basis,
    earlier: (hidden ? [] : before).map((m) => ({
      id: m.id,
      where: markPlace(m),
      revision: m.revision,
      kind: m.kind,
      text: m.text,
    })),
    inputs: (hidden ? [] : listInputs(draft.parse(r.inputs))).map((i) => ({
      ...i,
      mark: atInput(marks, i.place),
    })),
  };
}

function atInput(marks: readonly MarkRow[], place: string) {
  const mark = marks.find((m) => m.place === 'input' && m.line === place);
  return mark && { kind: mark.kind, text: mark.text, drawing: mark.drawing };
}

/** The sheet that the checker made, and the frozen comparison. */
async function ownSheet(officeId: string, checkId: string) {
  const db = database();
  const own = await ownSheetOfCheck(db, officeId, checkId);
  if (!own) return undefined;
  const [newest] = await revisionsOfSheet(db, officeId, own.sheet_id);
  const compared = await comparisonOf(db, officeId, checkId);
  const pairs: ValuePair[] = compared ? valuePair.array().parse(compared.pairs) : [];
  return {
    sheetId: own.sheet_id,
    name: sheetName(own.number),
    revision: newest && { id: newest.id, number: newest.number },
    comparison: compared && { pairs, at: compared.at, revisionId: compared.own_revision_id },
  };
}
