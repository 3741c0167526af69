import type { FieldError } from '@/lib/model/field-reader';

export const deskSteps = [
  { key: 'basis', title: 'Basis' },
  { key: 'geometry', title: 'Geometry' },
  { key: 'supports', title: 'Supports' },
  { key: 'loads', title: 'Loads' },
  { key: 'combinations', title: 'Combinations' },
  { key: 'redundants', title: 'Redundants' },
  { key: 'results', title: 'Results' },
  { key: 'checks', title: 'Checks' },
] as const;

export type DeskStepKey = (typeof deskSteps)[number]['key'];

/** The step whose form holds the field at `path`. */
export function stepOfPath(path: string): DeskStepKey {
  if (/^geometry\.(supports|leftBase|rightBase)\b|^geometry\.joints\.\d+\.support\b/.test(path))
    return 'supports';
  if (/^(geometry|stiffness|joints|members|basis\b.*EI0)/.test(path)) return 'geometry';
  if (path.startsWith('cases')) return 'loads';
  if (path.startsWith('combination')) return 'combinations';
  if (path.startsWith('redundants')) return 'redundants';
  if (path.startsWith('displacements')) return 'results';
  return 'basis';
}

export function errorsOfStep(errors: readonly FieldError[], step: DeskStepKey): FieldError[] {
  return errors.filter((e) => stepOfPath(e.path) === step);
}
