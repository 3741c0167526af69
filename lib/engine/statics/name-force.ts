import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from './equilibrium';

/** A force in a sentence: R1x, the fixing moment at 1, N of 2–3, M at 2 of 2–3. */
export function forceName(eq: Equilibrium, q: Quantity): string {
  switch (q.kind) {
    case 'reaction':
      return q.component === 'turn' ? `the fixing moment at ${q.joint}` : `R${q.joint}${q.component}`;
    case 'axial':
      return `N of ${q.member}`;
    case 'moment':
      return `M at ${endJoint(eq, q)} of ${q.member}`;
  }
}

/** The joint at which an end moment acts. */
export function endJoint(eq: Equilibrium, q: Extract<Quantity, { kind: 'moment' }>): string {
  const bar = eq.bars.find((b) => b.member.id === q.member);
  return (q.end === 'start' ? bar?.member.start : bar?.member.end) ?? '';
}

/** "a", "a and b", "a, b and c"; beyond `most` the rest are counted. */
export function listed(names: readonly string[], most = 6): string {
  const shown =
    names.length > most ? [...names.slice(0, most - 1), `${names.length - most + 1} more`] : names;
  if (shown.length < 2) return shown.join('');
  return `${shown.slice(0, -1).join(', ')} and ${shown.at(-1)}`;
}
