import type { LoadCase } from '@/lib/model/load';
import type { Stations } from './add-dimensions';
import type { Prepared } from './draw-structure';

/** Ends of loads that stand between joints: they get dimensions of their own. */
export function stationsOf({ axes }: Prepared, { loads }: LoadCase): Stations {
  const points = loads.flatMap((load) => {
    if (load.kind !== 'point' && load.kind !== 'couple' && load.kind !== 'distributed') return [];
    const axis = axes.get(load.member);
    if (!axis) return [];
    const places = load.kind === 'distributed' ? [load.from ?? 0, load.to ?? axis.length] : [load.at];
    return places.filter((s) => s > 0 && s < axis.length).map((s) => ({ ...axis.at(s), along: axis.along }));
  });
  return {
    x: points.filter((p) => Math.abs(p.along.x) > 0.3).map((p) => p.x),
    y: points.filter((p) => Math.abs(p.along.x) <= 0.3).map((p) => p.y),
  };
}
