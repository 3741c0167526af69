'use client';

import { drawLoads } from '@/lib/figures/draw-loads';
import { drawStructure } from '@/lib/figures/draw-structure';
import type { Drawing } from '@/lib/figures/drawing';
import { analysisForm, analysis as analysisSchema } from '@/lib/model/analysis';
import type { Draft } from '@/lib/model/draft';
import { readDraft } from '@/lib/model/read-draft';
import { DrawingView } from '@/templates/screen/drawing-view';
import { measureLabel } from '@/templates/screen/lay-out-label';
import { useDesk } from './desk-context';

/** The structure to scale as far as it can be read, with the loads of the case in hand. */
export function LiveDrawing({ caseIndex, width }: { caseIndex: number | undefined; width: number }) {
  const { draft, lit, light } = useDesk();
  const drawing = drawDraft(draft, caseIndex, width);
  if (!drawing) return <p className="ans drawwait">The drawing starts with the first length.</p>;
  return (
    <div className="draw gr live-draw">
      <DrawingView drawing={drawing} lit={lit} onLight={light} />
    </div>
  );
}

/** Draws what can be read; a structure that is not complete yet is drawn without its loads. */
function drawDraft(draft: Draft, caseIndex: number | undefined, width: number): Drawing | undefined {
  const read = readDraft(draft);
  const known = read.ok ? read.analysis : undefined;
  const geometry = read.ok ? read.analysis : read.geometry;
  const parsed = analysisSchema.safeParse(
    known ?? {
      form: analysisForm,
      units: draft.units,
      basis: { kind: 'relative' },
      joints: geometry.joints,
      members: geometry.members.filter(
        (m) => [m.start, m.end].every((id) => geometry.joints.some((j) => j.id === id)) && m.start !== m.end,
      ),
      cases: [],
    },
  );
  if (!parsed.success || parsed.data.members.length > 400) return undefined;
  const chosen = caseIndex === undefined ? undefined : parsed.data.cases[caseIndex];
  return chosen
    ? drawLoads(parsed.data, chosen, { width, measure: measureLabel })
    : drawStructure(parsed.data, { width, measure: measureLabel });
}
