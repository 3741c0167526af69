// server only
import type { Knex } from 'knex';
import { checkById, type MarkStep, markStepsOf, marksOf } from '@/db/queries/checks';
import { comparisonOf } from '@/db/queries/own-sheets';
import { peopleOf } from '@/db/queries/people';
import { revisionById } from '@/db/queries/revisions';
import { draft } from '@/lib/model/draft';
import { listInputs } from '@/lib/model/list-inputs';
import { blocks } from '@/templates/block';
import type { CertifiedCheck } from '@/templates/compose-certificate';
import { writeDate } from '@/templates/paper/imprint';
import type { Actor } from './actor';
import { dayIn } from './day-in';
import { markPlace, markState } from './mark-state';
import { valuePair } from './result-values';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const stateWords: Record<MarkStep, string> = {
  answered: 'answered',
  accepted: 'accepted',
  reopened: 'opened again',
  verified: 'verified',
  carried: 'carried on',
};
const kindWords = { agrees: 'agrees', correct: 'correct this', query: 'query' };
/** What the record holds of a check, as it is certified; days are those of the office. Throws NotFound without such a check. */
export async function certifiedCheck(
  db: Knex,
  { officeId, zone }: Pick<Actor, 'officeId' | 'zone'>,
  checkId: string,
): Promise<CertifiedCheck> {
  const day = (at: Date) => writeDate(dayIn(zone, at));
  const check = await checkById(db, officeId, checkId);
  const r = check && (await revisionById(db, officeId, check.revision_id));
  if (!check || !r) throw new NotFound(`check ${checkId}`);
  const [marks, steps, people, compared] = await Promise.all([
    marksOf(db, officeId, checkId),
    markStepsOf(db, officeId, checkId),
    peopleOf(db, officeId),
    comparisonOf(db, officeId, checkId),
  ]);
  const checker = people.find((p) => p.id === check.checker_id);
  if (!checker) throw new Error(`the checker of ${checkId} is gone`);
  const inputs = listInputs(draft.parse(r.inputs));
  return {
    sheet: sheetName(r.sheet_number),
    title: r.title,
    revision: r.number,
    digest: r.digest,
    originator: r.originator_name,
    frozen: day(r.frozen_at),
    checker: checker.name,
    organisation: checker.organisation,
    category: check.category,
    standardSolution: check.standard_solution,
    blind: Number(check.blind) === 1,
    given: day(check.opened_at),
    standing: check.closed_at ? `${check.state}, ${day(check.closed_at)}` : standing(check.state),
    note: check.note,
    declaration: check.declaration,
    lines: blocks.parse(r.blocks).length,
    marks: marks.map((m) => {
      const state = markState(m.kind, m.last_step);
      return {
        place: m.place,
        where: markPlace(m),
        kind: m.kind,
        text: m.text,
        drawing: m.drawing,
        state: state === 'agrees' || state === 'open' ? state : stateWords[state],
        steps: steps
          .filter((s) => s.mark_id === m.id)
          .map((s) => ({ word: stateWords[s.kind], text: s.text, by: s.initials, at: day(s.at) })),
      };
    }),
    inputs: inputs.map((i) => {
      const mark = marks.find((m) => m.place === 'input' && m.line === i.place);
      return mark ? { ...i, mark: kindWords[mark.kind], drawing: mark.drawing } : i;
    }),
    ...(compared ? { comparison: await sideBySide(db, officeId, compared, day) } : {}),
  };
}

const standing = (state: string) => (state === 'open' ? 'in checking' : state);

async function sideBySide(
  db: Knex,
  officeId: string,
  compared: { own_revision_id: string; pairs: unknown; at: Date },
  day: (at: Date) => string,
) {
  const own = await revisionById(db, officeId, compared.own_revision_id);
  if (!own) throw new Error(`revision ${compared.own_revision_id} is gone`);
  const pairs = valuePair.array().parse(compared.pairs);
  return { own: `${sheetName(own.sheet_number)} revision ${own.number}`, at: day(compared.at), pairs };
}
