import type { DraftGeometry, DraftJoint, DraftMember } from './draft';
import type { FieldReader } from './field-reader';
import { placesAlong, readSizes } from './read-sizes';
import type { StartingChoice } from './starting-choice';
import { blankStiffness, blankSupport } from './starting-draft';

type Frame = Extract<DraftGeometry, { shape: 'frame' }>;
type Choice<Name extends StartingChoice['start']> = Extract<StartingChoice, { start: Name }>;

const joint = (
  id: number,
  x: string,
  y: string,
  kind: DraftJoint['support']['kind'] = 'free',
): DraftJoint => ({
  id: `${id}`,
  x,
  y,
  support: blankSupport(kind),
});
const member = (start: number, end: number): DraftMember => ({
  start: `${start}`,
  end: `${end}`,
  startHinge: false,
  endHinge: false,
  stiffness: blankStiffness(),
});

/** Two columns and two rafters that meet at a ridge over the middle. */
export function layOutGable(fields: FieldReader, c: Choice<'gable'>): Frame | undefined {
  const span = fields.positive('span', c.span, 'length', 'The span');
  const eaves = fields.positive('eaves', c.eaves, 'length', 'The height of the eaves');
  const ridge = fields.positive('ridge', c.ridge, 'length', 'The height of the ridge');
  if (span === undefined || eaves === undefined || ridge === undefined) return undefined;
  if (ridge <= eaves) return fields.refuse('ridge', 'The ridge must lie above the eaves.');
  return {
    shape: 'frame',
    joints: [
      joint(1, '0', '0', c.bases),
      joint(2, '0', c.eaves),
      joint(3, `(${c.span})/2`, c.ridge),
      joint(4, c.span, c.eaves),
      joint(5, c.span, '0', c.bases),
    ],
    members: [member(1, 2), member(2, 3), member(3, 4), member(4, 5)],
  };
}

/** A column and a beam that meet rigidly at a knee. */
export function layOutKnee(fields: FieldReader, c: Choice<'knee'>): Frame | undefined {
  const height = fields.positive('height', c.height, 'length', 'The height');
  const span = fields.positive('span', c.span, 'length', 'The span');
  if (height === undefined || span === undefined) return undefined;
  return {
    shape: 'frame',
    joints: [joint(1, '0', '0', c.bases), joint(2, '0', c.height), joint(3, c.span, c.height, c.far)],
    members: [member(1, 2), member(2, 3)],
  };
}

/** Bays and storeys of columns and beams; joints are numbered up each line of columns, from the left. */
export function layOutStoreys(fields: FieldReader, c: Choice<'storeys'>): Frame | undefined {
  const bays = readSizes(fields, 'bays', c.bays, 'The widths of the bays', 30);
  const heights = readSizes(fields, 'heights', c.heights, 'The heights of the storeys', 40);
  if (!bays || !heights) return undefined;
  const levels = heights.length + 1;
  const id = (line: number, level: number) => line * levels + level + 1;
  const joints = placesAlong(bays).flatMap((x, line) =>
    placesAlong(heights).map((y, level) => joint(id(line, level), x, y, level === 0 ? c.bases : 'free')),
  );
  const columns = joints.flatMap((_, i) => ((i + 1) % levels === 0 ? [] : [member(i + 1, i + 2)]));
  const beams = bays.flatMap((_, bay) =>
    heights.map((__, storey) => member(id(bay, storey + 1), id(bay + 1, storey + 1))),
  );
  return { shape: 'frame', joints, members: [...columns, ...beams] };
}
