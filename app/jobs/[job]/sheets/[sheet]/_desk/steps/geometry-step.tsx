'use client';

import type { Draft } from '@/lib/model/draft';
import { toFrame } from '@/lib/model/to-frame';
import { useDesk } from '../desk-context';
import { BeamGeometry } from './beam-geometry';
import { FrameGeometry } from './frame-geometry';
import { PortalGeometry } from './portal-geometry';
import { StiffnessFields } from './stiffness-fields';

/** Spans, heights or joints and members, and how stiff each is. */
export function GeometryStep() {
  const { draft, change } = useDesk();
  return (
    <>
      <StiffnessFields />
      <Shape draft={draft} />
      {draft.geometry.shape === 'frame' ? null : (
        <p className="ans">
          <button type="button" className="linkish" onClick={() => change('shape', toFrame)}>
            Turn into joints and members
          </button>{' '}
          for a shape this form does not know; nothing typed is lost.
        </p>
      )}
    </>
  );
}

function Shape({ draft }: { draft: Draft }) {
  const g = draft.geometry;
  switch (g.shape) {
    case 'beam':
      return <BeamGeometry spans={g.spans} supports={g.supports} />;
    case 'portal':
      return <PortalGeometry geometry={g} />;
    case 'frame':
      return <FrameGeometry joints={g.joints} members={g.members} />;
  }
}
