import {
  type Draft,
  type DraftGeometry,
  type DraftStiffness,
  type DraftSupport,
  draft,
  draftForm,
} from './draft';

/** The forms that a sheet can have at the desk. */
export type StartingSheet = DraftGeometry['shape'];

const stiffness: DraftStiffness = {
  k: '1',
  E: '',
  I: '',
  A: '',
  G: '',
  As: '',
  weight: '',
  depth: '',
  section: '',
};

export function blankStiffness(): DraftStiffness {
  return { ...stiffness };
}

export function blankSupport(kind: DraftSupport['kind']): DraftSupport {
  return { kind, angle: '', springX: '', springY: '', springTurn: '' };
}

/** An empty sheet of a kind: only what that kind asks for, in the office's unit set, stiffness as multiples of EI0. */
export function startingDraft(kind: StartingSheet, units: Draft['units'], title: string): Draft {
  return draft.parse({
    form: draftForm,
    units,
    title,
    stiffness: { kind: 'relative' },
    geometry: startingGeometry(kind),
    cases: [{ id: units === 'US' ? 'D' : 'G', title: 'Dead', nature: 'dead', loads: [] }],
  });
}

function startingGeometry(kind: StartingSheet): DraftGeometry {
  switch (kind) {
    case 'beam':
      return {
        shape: 'beam',
        spans: [
          { length: '', stiffness: blankStiffness() },
          { length: '', stiffness: blankStiffness() },
        ],
        supports: [blankSupport('pinned'), blankSupport('roller'), blankSupport('roller')],
      };
    case 'portal':
      return {
        shape: 'portal',
        span: '',
        leftHeight: '',
        rightHeight: '',
        leftBase: blankSupport('pinned'),
        rightBase: blankSupport('pinned'),
        leftColumn: blankStiffness(),
        beam: blankStiffness(),
        rightColumn: blankStiffness(),
      };
    case 'frame':
      return { shape: 'frame', joints: [], members: [] };
  }
}
