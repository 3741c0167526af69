'use client';

import { type CSSProperties, useMemo, useState } from 'react';
import { drawLoads } from '@/lib/figures/draw-loads';
import { drawStructure } from '@/lib/figures/draw-structure';
import type { Drawing } from '@/lib/figures/drawing';
import { analysisForm, analysis as analysisSchema } from '@/lib/model/analysis';
import type { Draft } from '@/lib/model/draft';
import { readDraft } from '@/lib/model/read-draft';
import { DrawingView } from '@/templates/screen/drawing-view';
import { measureLabel } from '@/templates/screen/lay-out-label';
import { useDesk } from './desk-context';
import { DrawingElements } from './drawing-elements';
import { DrawingTools, type Shown } from './drawing-tools';

interface Props {
  /** The case whose loads are drawn; none on the steps before them. */
  caseIndex: number | undefined;
  width: number;
  shown: Shown;
  onShow: (shown: Shown) => void;
  /** Diagrams of the case in hand, when the sheet is solved. */
  overlay: Drawing | undefined;
}

/** The structure to scale as far as it can be read, with the loads of the case in hand or a diagram over it. */
export function LiveDrawing({ caseIndex, width, shown, onShow, overlay }: Props) {
  const { draft, lit, light, open } = useDesk();
  const [zoom, setZoom] = useState(1);
  const own = useMemo(() => drawDraft(draft, caseIndex, width), [draft, caseIndex, width]);
  const drawing = shown === 'structure' ? own : (overlay ?? own);
  if (!drawing) return <p className="ans drawwait">The drawing starts with the first length.</p>;
  return (
    <div className="drawframe">
      {/* Enlarged, the drawing scrolls inside its frame, by keyboard as well (WCAG 2.1.1). */}
      <section className="draw gr live-draw" aria-label="Drawing" {...(zoom > 1 ? { tabIndex: 0 } : {})}>
        <div className="scaled" style={{ '--zoom': zoom } as CSSProperties}>
          <DrawingView drawing={drawing} lit={lit} onLight={light} onPick={open} />
        </div>
      </section>
      <DrawingTools
        shown={shown}
        solved={overlay !== undefined}
        onShow={onShow}
        zoom={zoom}
        onZoom={setZoom}
      />
      <DrawingElements />
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
