import { type KindName, kinds } from '@/lib/units/kind';
import { readQuantity } from '@/lib/units/read-quantity';
import { convertCoherent, writeQuantity } from '@/lib/units/write-quantity';
import type { Draft, DraftLoad, DraftStiffness, DraftSupport } from './draft';
import { loadFieldKinds } from './load-field';

type Units = Draft['units'];

/**
 * The sheet in the other unit set. Every value that can be read is written anew in its own unit to ten figures; text
 * that cannot be read, parts of a span (L/3) and blanks stay as they are.
 */
export function convertDraft(draft: Draft, to: Units): Draft {
  const from = draft.units;
  if (from === to) return draft;
  const value = (text: string, kind: KindName) => convertText(text, kind, from, to);
  return {
    ...draft,
    units: to,
    stiffness: {
      ...draft.stiffness,
      EI0: value(draft.stiffness.EI0, 'bendingStiffness'),
      E: value(draft.stiffness.E, 'modulus'),
      G: value(draft.stiffness.G, 'modulus'),
      alpha: value(draft.stiffness.alpha, 'expansion'),
    },
    geometry: convertGeometry(draft.geometry, value),
    cases: draft.cases.map((c) => ({ ...c, loads: c.loads.map((row) => convertLoad(row, value)) })),
    displacements: draft.displacements.map((ask) => ({
      ...ask,
      at: value(ask.at, 'length'),
      limit: value(ask.limit, 'length'),
    })),
  };
}

type Convert = (text: string, kind: KindName) => string;

function convertText(text: string, kind: KindName, from: Units, to: Units): string {
  if (kinds[kind].dimension === kinds.number.dimension || text.trim() === '') return text;
  const read = readQuantity(text, kind, from);
  return read.ok ? writeQuantity(convertCoherent(read.value, kind, from, to), kind, to, 10) : text;
}

function convertGeometry(g: Draft['geometry'], value: Convert): Draft['geometry'] {
  const stiff = (s: DraftStiffness): DraftStiffness => ({
    ...s,
    E: value(s.E, 'modulus'),
    I: value(s.I, 'inertia'),
    A: value(s.A, 'area'),
    G: value(s.G, 'modulus'),
    As: value(s.As, 'area'),
    weight: value(s.weight, 'distributed'),
    depth: value(s.depth, 'sectionLength'),
  });
  const held = (s: DraftSupport): DraftSupport => ({
    ...s,
    springX: value(s.springX, 'spring'),
    springY: value(s.springY, 'spring'),
    springTurn: value(s.springTurn, 'turnSpring'),
  });
  switch (g.shape) {
    case 'beam':
      return {
        ...g,
        spans: g.spans.map((s) => ({ length: value(s.length, 'length'), stiffness: stiff(s.stiffness) })),
        supports: g.supports.map(held),
      };
    case 'portal':
      return {
        ...g,
        span: value(g.span, 'length'),
        leftHeight: value(g.leftHeight, 'length'),
        rightHeight: value(g.rightHeight, 'length'),
        leftBase: held(g.leftBase),
        rightBase: held(g.rightBase),
        leftColumn: stiff(g.leftColumn),
        beam: stiff(g.beam),
        rightColumn: stiff(g.rightColumn),
      };
    case 'frame':
      return {
        ...g,
        joints: g.joints.map((j) => ({
          ...j,
          x: value(j.x, 'length'),
          y: value(j.y, 'length'),
          support: held(j.support),
        })),
        members: g.members.map((m) => ({ ...m, stiffness: stiff(m.stiffness) })),
      };
  }
}

function convertLoad(row: DraftLoad, value: Convert): DraftLoad {
  const { first, second } = loadFieldKinds(row);
  return {
    ...row,
    first: first ? value(row.first, first) : row.first,
    second: second ? value(row.second, second) : row.second,
    from: value(row.from, 'length'),
    to: value(row.to, 'length'),
  };
}
