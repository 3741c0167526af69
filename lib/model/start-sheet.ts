import type { Draft, DraftGeometry } from './draft';
import { type FieldError, FieldReader } from './field-reader';
import { layOutGable, layOutKnee, layOutStoreys } from './lay-out-frame';
import type { SpanEnds, StartingChoice } from './starting-choice';
import { blankStiffness, blankSupport, startingDraft } from './starting-draft';

export type Started = { ok: true; draft: Draft } | { ok: false; errors: FieldError[] };

/** The first draft of a sheet from what its starting sheet asked for, or a sentence at each field that cannot be read. */
export function startSheet(choice: StartingChoice, units: Draft['units'], title: string): Started {
  const fields = new FieldReader(units);
  const geometry = layOut(fields, choice);
  if (fields.errors.length > 0) return { ok: false, errors: fields.errors };
  const shape =
    geometry?.shape ?? (choice.start === 'portal' ? 'portal' : choice.start === 'frame' ? 'frame' : 'beam');
  const draft = startingDraft(shape, units, title);
  return { ok: true, draft: geometry ? { ...draft, geometry } : draft };
}

function layOut(fields: FieldReader, choice: StartingChoice): DraftGeometry | undefined {
  switch (choice.start) {
    case 'single':
      return singleSpan(choice.ends);
    case 'gable':
      return layOutGable(fields, choice);
    case 'knee':
      return layOutKnee(fields, choice);
    case 'storeys':
      return layOutStoreys(fields, choice);
    default:
      return undefined;
  }
}

const supportsOf: Record<SpanEnds, Parameters<typeof blankSupport>[0][]> = {
  simple: ['pinned', 'roller'],
  propped: ['fixed', 'roller'],
  fixed: ['fixed', 'fixed'],
  overhang: ['fixed', 'roller', 'free'],
};

function singleSpan(ends: SpanEnds): DraftGeometry {
  const supports = supportsOf[ends].map(blankSupport);
  const spans = supports.slice(1).map(() => ({ length: '', stiffness: blankStiffness() }));
  return { shape: 'beam', spans, supports };
}
