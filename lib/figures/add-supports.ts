import type { Sheet } from './fit-drawing';
import { directionsFrom, type Frame, type MemberAxis } from './member-axis';
import { drawSupportSign, type SupportSign, supportSign } from './support-symbol';

/** Signs of all supports, in model directions, by joint. */
export function supportSigns(frame: Frame, axes: ReadonlyMap<string, MemberAxis>): Map<string, SupportSign> {
  const signs = new Map<string, SupportSign>();
  for (const { id, support } of frame.joints) {
    if (support) signs.set(id, supportSign(support, directionsFrom(id, axes)));
  }
  return signs;
}

/** Draws every support with the trade's sign. */
export function addSupports(
  { sketch, view }: Sheet,
  frame: Frame,
  signs: ReadonlyMap<string, SupportSign>,
): void {
  for (const joint of frame.joints) {
    const sign = signs.get(joint.id);
    if (!sign) continue;
    drawSupportSign(
      sketch,
      view.at(joint),
      {
        ...sign,
        ground: view.direction(sign.ground),
        springs: sign.springs.map((s) => ({ toward: view.direction(s.toward) })),
        link: sign.link && view.direction(sign.link),
      },
      { of: 'support', id: joint.id },
    );
  }
}
