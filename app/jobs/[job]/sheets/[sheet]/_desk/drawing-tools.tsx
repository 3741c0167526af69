'use client';

import { type Overlay, overlays } from './writing';

export type Shown = Overlay | 'structure';

export const shownNames: Record<Shown, string> = {
  structure: 'Structure',
  N: 'Axial force',
  V: 'Shear',
  M: 'Moments',
  deflected: 'Deflected shape',
};

interface Props {
  shown: Shown;
  /** Diagrams can be shown once the sheet is solved. */
  solved: boolean;
  onShow: (shown: Shown) => void;
  zoom: number;
  onZoom: (zoom: number) => void;
}

/** Under the drawing: what is drawn over the structure, and how large it is. */
export function DrawingTools({ shown, solved, onShow, zoom, onZoom }: Props) {
  return (
    <div className="drawtools">
      <fieldset>
        <legend className="sr-only">Shown on the drawing</legend>
        {(['structure', ...overlays] as const).map((which) => (
          <button
            key={which}
            type="button"
            aria-pressed={shown === which}
            disabled={which !== 'structure' && !solved}
            onClick={() => onShow(which)}
          >
            {shownNames[which]}
          </button>
        ))}
      </fieldset>
      <span className="zoom">
        <button type="button" aria-label="Smaller" disabled={zoom <= 1} onClick={() => onZoom(zoom - 0.5)}>
          −
        </button>
        <button type="button" aria-label="Larger" disabled={zoom >= 4} onClick={() => onZoom(zoom + 0.5)}>
          +
        </button>
        <button type="button" onClick={() => onZoom(1)}>
          Fit
        </button>
      </span>
    </div>
  );
}
