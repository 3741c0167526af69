import type { Draft, DraftSupport } from './draft';

/** One support as a row of a table, whatever the shape of the sheet keeps it in. */
export interface SupportRow {
  joint: string;
  support: DraftSupport;
}

export function supportRows(draft: Draft): SupportRow[] {
  const g = draft.geometry;
  switch (g.shape) {
    case 'beam':
      return g.supports.map((support, i) => ({ joint: `${i + 1}`, support }));
    case 'portal':
      return [
        { joint: '1', support: g.leftBase },
        { joint: '4', support: g.rightBase },
      ];
    case 'frame':
      return g.joints.map((j) => ({ joint: j.id, support: j.support }));
  }
}

/** Path of the support of row `index` in the draft. */
export function supportPath(draft: Draft, index: number): string {
  switch (draft.geometry.shape) {
    case 'beam':
      return `geometry.supports.${index}`;
    case 'portal':
      return index === 0 ? 'geometry.leftBase' : 'geometry.rightBase';
    case 'frame':
      return `geometry.joints.${index}.support`;
  }
}

/** The draft with its supports exchanged, in the order of supportRows. */
export function writeSupports(draft: Draft, supports: readonly DraftSupport[]): Draft {
  const g = draft.geometry;
  switch (g.shape) {
    case 'beam':
      return { ...draft, geometry: { ...g, supports: [...supports] } };
    case 'portal': {
      const [leftBase, rightBase] = supports;
      if (!leftBase || !rightBase) throw new Error('a portal has two bases');
      return { ...draft, geometry: { ...g, leftBase, rightBase } };
    }
    case 'frame': {
      const joints = g.joints.map((j, i) => ({ ...j, support: supports[i] ?? j.support }));
      return { ...draft, geometry: { ...g, joints } };
    }
  }
}
