import { type AnalysisInput, analysisForm, type DisplacementAsk } from './analysis';
import type { Draft } from './draft';
import { type FieldError, FieldReader } from './field-reader';
import type { LoadCase } from './load';
import { readCombinations } from './read-combination';
import { type Geometry, readGeometry } from './read-geometry';
import { readLoad } from './read-load';

export type DraftReading =
  | { ok: true; analysis: AnalysisInput }
  /** `geometry` is what could be read so far, so that a form can draw it while the rest is being typed. */
  | { ok: false; errors: FieldError[]; geometry: Geometry };

/** Turns the texts of a draft into an analysis in coherent units, or says at each field what cannot be read. */
export function readDraft(draft: Draft): DraftReading {
  const reader = new FieldReader(draft.units);
  const geometry = readGeometry(reader, draft);
  const lengths = memberLengths(geometry);
  const joints = new Set(geometry.joints.map((j) => j.id));
  const cases = draft.cases.map((c, i): LoadCase => {
    if (c.id.trim() === '') reader.refuse(`cases.${i}.id`, 'A case needs a symbol, such as D.');
    if (draft.cases.findIndex((other) => other.id === c.id) < i) {
      reader.refuse(`cases.${i}.id`, `There is a case ${c.id} already.`);
    }
    const loads = c.loads.flatMap((row, k) => {
      const read = readLoad(reader, `cases.${i}.loads.${k}`, row, lengths, joints);
      return read ? [read] : [];
    });
    const category = c.category.trim() === '' ? undefined : c.category.trim();
    return { id: c.id, title: c.title, nature: c.nature, category, reversible: c.reversible, loads };
  });
  const displacements = readAsks(reader, draft, lengths);
  const combinations = readCombinations(reader, draft);
  const EI0 = reader.optional('stiffness.EI0', draft.stiffness.EI0, 'bendingStiffness', 'EI0');
  if (reader.errors.length > 0) return { ok: false, errors: reader.errors, geometry };
  return {
    ok: true,
    analysis: {
      form: analysisForm,
      units: draft.units,
      title: draft.title,
      basis: draft.stiffness.kind === 'relative' ? { kind: 'relative', EI0 } : { kind: 'absolute' },
      ...geometry,
      cases,
      combinations,
      redundants: draft.redundants,
      displacements,
    },
  };
}

function readAsks(
  reader: FieldReader,
  draft: Draft,
  lengths: ReadonlyMap<string, number>,
): DisplacementAsk[] {
  return draft.displacements.flatMap((ask, i) => {
    const path = `displacements.${i}`;
    const L = lengths.get(ask.member);
    if (L === undefined) {
      reader.refuse(
        `${path}.member`,
        ask.member === '' ? 'A member is missing here.' : `There is no member ${ask.member}.`,
      );
      return [];
    }
    const at = reader.read(`${path}.at`, ask.at, 'length', L);
    const limit = ask.limit.trim() === '' ? undefined : reader.read(`${path}.limit`, ask.limit, 'length', L);
    if (at === undefined) return [];
    const { member, direction } = ask;
    return [
      {
        member,
        at,
        direction,
        limit: limit === undefined ? undefined : { value: limit, source: ask.source },
      },
    ];
  });
}

/** Length of every member whose joints are known. */
export function memberLengths(geometry: Geometry): Map<string, number> {
  const at = new Map(geometry.joints.map((j) => [j.id, j]));
  return new Map(
    geometry.members.flatMap((m): [string, number][] => {
      const a = at.get(m.start);
      const b = at.get(m.end);
      return a && b ? [[m.id, Math.hypot(b.x - a.x, b.y - a.y)]] : [];
    }),
  );
}
