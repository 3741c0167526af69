import type { Member } from '@/lib/model/structure';
import { addDimensions, type Stations } from './add-dimensions';
import { addJointNames } from './add-joint-names';
import { addMemberTexts } from './add-member-texts';
import { addMembers, addReleases } from './add-members';
import { addScaleBar } from './add-scale-bar';
import { addSupports, supportSigns } from './add-supports';
import { describeStructure } from './describe-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing, type Sheet } from './fit-drawing';
import { type Frame, type MemberAxis, memberAxes } from './member-axis';
import type { SupportSign } from './support-symbol';

/** Parts of the structure a drawing may show or leave out. */
export interface Show {
  innerFace?: boolean;
  names?: boolean;
  dimensions?: boolean;
  scaleBar?: boolean;
  /** Members as thin lines. */
  thin?: boolean;
  /** Rich text beside a member: "$2\,EI_0$", a section, its name. */
  memberText?: (member: Member) => string | undefined;
  /** Redundants with their arrows, where the drawing has any; without them only what is taken out is seen. */
  redundants?: boolean;
}

/** The structure ready to be drawn: axes of members and signs of supports. */
export interface Prepared {
  frame: Frame;
  axes: ReadonlyMap<string, MemberAxis>;
  signs: ReadonlyMap<string, SupportSign>;
}

export function prepare(frame: Frame): Prepared {
  const axes = memberAxes(frame);
  return { frame, axes, signs: supportSigns(frame, axes) };
}

/** Members, supports, hinges and joint names: what every drawing of the structure begins with. */
export function addStructure(sheet: Sheet, { frame, axes, signs }: Prepared, show: Show): void {
  addSupports(sheet, frame, signs);
  addMembers(sheet, frame, axes, show);
  addReleases(sheet, frame, axes);
  if (show.memberText) addMemberTexts(sheet, axes, show.memberText);
  if (show.names ?? true) addJointNames(sheet, frame, axes, signs);
}

/** Dimensions and scale bar: what it ends with, when all else is drawn. */
export function addMeasures(sheet: Sheet, { frame }: Prepared, show: Show, stations?: Stations): void {
  if (show.dimensions) addDimensions(sheet, frame, stations);
  if (show.scaleBar) addScaleBar(sheet, frame.units);
}

/** The structure to scale: members, inner face, supports, hinges, joint names, dimensions. */
export function drawStructure(frame: Frame, options: DrawOptions & { show?: Show }): Drawing {
  const ready = prepare(frame);
  const show = { innerFace: true, dimensions: true, scaleBar: options.width >= 280, ...options.show };
  return fitDrawing(frame, options, describeStructure(frame), (sheet) => {
    addStructure(sheet, ready, show);
    addMeasures(sheet, ready, show);
  });
}
