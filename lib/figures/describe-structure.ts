import type { Support } from '@/lib/model/structure';
import type { Frame } from './member-axis';

const unitOf = { US: 'ft', SI: 'm' };

/** The structure in words: its extent, members and supports. */
export function describeStructure(frame: Frame): string {
  const [xs, ys] = [frame.joints.map((j) => j.x), frame.joints.map((j) => j.y)];
  const wide = Math.max(...xs) - Math.min(...xs);
  const high = Math.max(...ys) - Math.min(...ys);
  const unit = unitOf[frame.units];
  const count = `${frame.members.length} ${frame.members.length === 1 ? 'member' : 'members'}`;
  const extent =
    high === 0 ? `${say(wide)} ${unit} long` : `${say(wide)} ${unit} wide and ${say(high)} ${unit} high`;
  const supports = frame.joints.flatMap((j) => (j.support ? [`${j.id} ${supportInWords(j.support)}`] : []));
  const hinges = frame.members.flatMap((m) =>
    (['start', 'end'] as const).flatMap((end) =>
      m.releases?.[end].includes('moment') ? [`${m.id} has a hinge at ${m[end]}`] : [],
    ),
  );
  return `${high === 0 ? 'Beam' : 'Frame'} of ${count}, ${extent}. ${list(supports)}.${hinges.length > 0 ? ` ${list(hinges)}.` : ''}`;
}

export function supportInWords(support: Support): string {
  const held = [support.x, support.y, support.turn].map((r) => r === 'held');
  const sprung = [support.x, support.y, support.turn].some((r) => typeof r === 'object');
  const turned = support.angle === 0 ? '' : ` turned by ${say(support.angle)}°`;
  if (sprung) return `on springs${turned}`;
  if (held[0] && held[1]) return held[2] ? 'is fixed' : 'is pinned';
  if (held[0] || held[1]) return `${held[2] ? 'is guided' : 'rests on a roller'}${turned}`;
  return held[2] ? 'is held against rotation' : 'is free';
}

/** A number in words of a sentence: as many figures as it needs, four at most. */
export const say = (v: number): string => String(Number(v.toPrecision(4))).replace('-', '−');

/** "a, b and c"; beyond eight the rest is counted. */
export function list(items: readonly string[]): string {
  if (items.length > 8) return `${items.slice(0, 7).join(', ')} and ${items.length - 7} more`;
  if (items.length < 2) return items[0] ?? '';
  return `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}
