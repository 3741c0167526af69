import type { LoadCase } from '@/lib/model/load';
import { addLoads } from './add-loads';
import { describeLoads } from './describe-loads';
import { describeStructure } from './describe-structure';
import { addMeasures, addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing } from './fit-drawing';
import { stationsOf } from './load-stations';
import type { Frame } from './member-axis';

/** The structure with the loads of one case at their places, to scale, with values and dimensions. */
export function drawLoads(frame: Frame, loadCase: LoadCase, options: DrawOptions & { show?: Show }): Drawing {
  const ready = prepare(frame);
  const show = { innerFace: true, dimensions: true, ...options.show };
  const alt = `${describeStructure(frame)} ${describeLoads(loadCase, frame.units)}`;
  return fitDrawing(frame, options, alt, (sheet) => {
    addStructure(sheet, ready, show);
    addLoads(sheet, ready, loadCase);
    addMeasures(sheet, ready, show, stationsOf(ready, loadCase));
  });
}
