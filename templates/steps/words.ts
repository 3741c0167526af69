import type { Placed } from '@/lib/engine/derivation/geometry';
import type { Analysis, UnitSet } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';

/** A name typed by a person, safe inside rich text. */
export const plain = (text: string): string => text.replaceAll('$', '\\$').replaceAll('*', '∗');

/** A–B for a member that joins A and B. */
export const memberWords = (p: Pick<Placed, 'start' | 'end'>): string => plain(`${p.start.id}–${p.end.id}`);

/** "a, b and c". */
export function listWords(items: readonly string[]): string {
  if (items.length < 2) return items[0] ?? '';
  return `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}

const spoken = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** Small numbers in words. */
export const countWords = (n: number): string => spoken[n] ?? `${n}`;

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Turning to the left: the word of the country. */
export const turning = (units: UnitSet): string => (units === 'US' ? 'counterclockwise' : 'anticlockwise');

export const unitNames = (units: UnitSet): { force: string; length: string; small: string } =>
  units === 'US' ? { force: 'kip', length: 'ft', small: 'in.' } : { force: 'kN', length: 'm', small: 'mm' };

/** What a force quantity is and when it is positive. */
export function quantityWords(
  q: Quantity,
  analysis: Analysis,
  placed: ReadonlyMap<string, Placed>,
  beam: boolean,
): string {
  switch (q.kind) {
    case 'reaction': {
      const joint = plain(q.joint);
      const angle = analysis.joints.find((j) => j.id === q.joint)?.support?.angle ?? 0;
      if (q.component === 'turn') return `fixing moment at ${joint}, positive ${turning(analysis.units)}`;
      if (angle !== 0) return `reaction at ${joint} along the ${q.component} axis of its support`;
      if (q.component === 'x') return `horizontal reaction at ${joint}, positive to the right`;
      return `vertical reaction at ${joint}, positive upward`;
    }
    case 'axial':
      return `axial force of ${memberOf(q.member, placed)}, positive in tension`;
    case 'moment': {
      const joint = endJoint(q.member, q.end, placed);
      if (beam) return `bending moment over ${joint}, positive with tension below`;
      const side = 'positive with tension on the right of the walk';
      return `bending moment at end ${joint} of ${memberOf(q.member, placed)}, ${side}`;
    }
  }
}

/** What is done to release a quantity: an order. */
export function releaseWords(
  q: Quantity,
  analysis: Analysis,
  placed: ReadonlyMap<string, Placed>,
  beam: boolean,
): string {
  switch (q.kind) {
    case 'reaction': {
      const joint = plain(q.joint);
      const support = analysis.joints.find((j) => j.id === q.joint)?.support;
      if (q.component === 'turn') return `put a hinge at support ${joint}`;
      const other = q.component === 'x' ? support?.y : support?.x;
      const held = other !== undefined && other !== 'free';
      if (held)
        return `put support ${joint} on a roller that moves ${q.component === 'x' ? 'sideways' : 'up and down'}`;
      return `take away support ${joint}`;
    }
    case 'axial':
      return `cut ${memberOf(q.member, placed)} so that it passes no axial force`;
    case 'moment': {
      const joint = endJoint(q.member, q.end, placed);
      return beam
        ? `put a hinge over ${joint}`
        : `put a hinge at end ${joint} of ${memberOf(q.member, placed)}`;
    }
  }
}

const memberOf = (id: string, placed: ReadonlyMap<string, Placed>): string => {
  const p = placed.get(id);
  return p ? memberWords(p) : plain(id);
};

function endJoint(id: string, end: 'start' | 'end', placed: ReadonlyMap<string, Placed>): string {
  const p = placed.get(id);
  return p ? plain(end === 'start' ? p.start.id : p.end.id) : '';
}
