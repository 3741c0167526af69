// server only

import { placeMembers } from '@/lib/engine/derivation/geometry';
import { nameQuantities } from '@/lib/engine/derivation/names';
import { proposedChoices } from '@/lib/engine/force-method/list-choices';
import type { Solution } from '@/lib/engine/solution';
import { drawDeflected } from '@/lib/figures/draw-deflected';
import { drawDiagram } from '@/lib/figures/draw-diagram';
import { drawMechanism } from '@/lib/figures/draw-mechanism';
import { drawPrimary } from '@/lib/figures/draw-primary';
import { drawUnit } from '@/lib/figures/draw-unit';
import { analysis as analysisSchema } from '@/lib/model/analysis';
import type { Draft } from '@/lib/model/draft';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import { readDraft } from '@/lib/model/read-draft';
import { solveDraft } from '@/lib/services/solve-draft';
import { symbolTex } from '@/lib/typeset/write-symbol';
import { measureLabel } from '@/templates/screen/lay-out-label';
import type { Overlay, QuantityChoice, Writing } from './_desk/writing';

const width = 418;

/** A draft solved and written, in the words and drawings the desk shows. */
export function describeWriting(draft: Draft, overlay: Overlay): Writing {
  const start = performance.now();
  const solved = solveDraft(draft);
  if (!solved.ok) {
    if (!solved.refusal) return { state: 'incomplete', errors: solved.errors };
    return {
      state: 'refused',
      refusal: solved.refusal,
      drawing: drawRefusal(draft, solved.refusal.mechanism),
    };
  }
  const { solution, blocks } = solved;
  const { analysis } = solution;
  const names = nameQuantities(analysis, placeMembers(analysis));
  const describe = (quantity: Quantity): QuantityChoice => ({
    quantity,
    key: quantityKey(quantity),
    symbol: `$${symbolTex(names.quantity(quantity))}$`,
    words: releaseWords(quantity),
  });
  const cases = analysis.cases.map((c) => c.id);
  const valuesOf = (values: (id: string) => number) =>
    cases.map((id) => ({ case: id, value: shown(values(id)) }));
  const options = { width, measure: measureLabel };
  return {
    state: 'written',
    blocks,
    milliseconds: performance.now() - start,
    degree: solution.determinacy.degree,
    redundants: solution.redundants.map(describe),
    proposed: solution.proposed,
    condition: solution.condition,
    choices: proposedChoices(solution).map(describe),
    fixed: solution.fixed.map((f) => ({
      ...describe(f.quantity),
      values: valuesOf((id) => f.values[id] as number),
    })),
    reactions: reactionRows(solution, describe, valuesOf),
    combinations: analysis.combinations.map((c) => ({ id: c.id, source: c.source ?? 'own' })),
    checks: solution.checks.map((c) => ({
      subject: c.case === undefined ? c.subject : `${c.case}: ${c.subject}`,
      residual: c.residual.toExponential(1).replace('-', '−'),
      tolerance: c.tolerance.toExponential(0).replace('-', '−'),
      holds: c.holds,
    })),
    primary: solution.redundants.length > 0 ? drawPrimary(analysis, solution.redundants, options) : undefined,
    units: solution.redundants.slice(0, 6).flatMap((quantity, i) => {
      const state = solution.primary.units[i];
      return state
        ? [
            {
              symbol: describe(quantity).symbol,
              drawing: drawUnit(analysis, solution.redundants, i, state, options),
            },
          ]
        : [];
    }),
    overlay: { which: overlay, drawings: cases.map((id) => drawOverlay(solution, id, overlay)) },
  };
}

const overlayNames = { N: 'Axial force', V: 'Shear', M: 'Moments' };

function drawOverlay(solution: Solution, id: string, which: Overlay) {
  const options = { width, measure: measureLabel };
  const solved = solution.cases[id];
  const members = solved?.members ?? {};
  return which === 'deflected'
    ? drawDeflected(solution.analysis, members, { ...options, timesEI0: solved?.displacementsTimesEI0 })
    : drawDiagram(solution.analysis, members, {
        ...options,
        which,
        title: `${overlayNames[which]}, case ${id}`,
      });
}

function reactionRows(
  solution: Solution,
  describe: (q: Quantity) => QuantityChoice,
  valuesOf: (values: (id: string) => number) => { case: string; value: string }[],
) {
  const first = Object.values(solution.cases)[0];
  const [force, moment] = solution.analysis.units === 'US' ? ['kip', 'kip·ft'] : ['kN', 'kN·m'];
  return (first?.reactions ?? []).map((r, i) => ({
    symbol: describe(r.quantity).symbol,
    values: valuesOf((id) => solution.cases[id]?.reactions[i]?.value as number),
    unit: r.quantity.kind === 'reaction' && r.quantity.component === 'turn' ? moment : force,
  }));
}

/** Three decimals, a true minus, no minus before zero. */
function shown(value: number): string {
  const text = value.toFixed(3);
  return Number(text) === 0 ? '0' : text.replace('-', '−');
}

function releaseWords(q: Quantity): string {
  switch (q.kind) {
    case 'reaction':
      return q.component === 'turn'
        ? `let ${q.joint} turn`
        : `let ${q.joint} move ${q.component === 'x' ? 'along' : 'across'}`;
    case 'axial':
      return `cut ${q.member} lengthwise`;
    case 'moment':
      return `hinge at the ${q.end} of ${q.member}`;
  }
}

function drawRefusal(draft: Draft, mechanism: Parameters<typeof drawMechanism>[2] | undefined) {
  const read = readDraft(draft);
  if (!mechanism || !read.ok) return undefined;
  return drawMechanism(analysisSchema.parse(read.analysis), [], mechanism, { width, measure: measureLabel });
}
