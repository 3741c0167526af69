import type { StaticState } from '@/lib/engine/solution';
import type { LoadCase } from '@/lib/model/load';
import type { Quantity } from '@/lib/model/quantity';
import { addLoads } from './add-loads';
import { addReactions } from './add-reactions';
import { addRedundants } from './add-redundants';
import { describeLoads } from './describe-loads';
import { describeRedundants } from './describe-redundants';
import { describeStructure } from './describe-structure';
import { addMeasures, addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing } from './fit-drawing';
import type { Frame } from './member-axis';
import { releaseQuantities } from './release-quantities';
import { decimalsFor } from './write-number';

export interface PrimaryOptions extends DrawOptions {
  /** The case whose loads act on it. */
  loadCase?: LoadCase;
  /** Reactions of that case, drawn with their values. */
  reactions?: StaticState['reactions'];
  decimals?: number;
  show?: Show;
}

/** The primary structure: the redundants taken out and shown in the sense in which they are positive. */
export function drawPrimary(frame: Frame, redundants: readonly Quantity[], options: PrimaryOptions): Drawing {
  const { loadCase, reactions = [], show = {} } = options;
  const released = releaseQuantities(frame, redundants);
  const ready = prepare(released);
  const decimals = options.decimals ?? decimalsFor(reactions.map((r) => r.value));
  const alt = [
    `Primary structure. ${describeRedundants(redundants)}`,
    describeStructure(released),
    ...(loadCase ? [describeLoads(loadCase, frame.units)] : []),
  ].join(' ');
  return fitDrawing(frame, options, alt, (sheet) => {
    addStructure(sheet, ready, show);
    if (loadCase) addLoads(sheet, ready, loadCase);
    // Senses of X are those of the real supports, so reactions let go are read from the frame as it was.
    const labels = show.redundants === false ? () => undefined : undefined;
    addRedundants(sheet, { ...ready, frame: withSupportAxes(released, frame) }, redundants, labels);
    addReactions(sheet, ready, reactions, decimals);
    addMeasures(sheet, ready, show);
  });
}

/** A support that is gone leaves its axes behind: the direction of its reaction. */
export function withSupportAxes(released: Frame, frame: Frame): Frame {
  const joints = released.joints.map((joint, i) => {
    const before = frame.joints[i]?.support;
    if (joint.support || !before) return joint;
    return { ...joint, support: { angle: before.angle, x: 'free', y: 'free', turn: 'free' } as const };
  });
  return { ...released, joints };
}
