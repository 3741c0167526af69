import type { Quantity } from '@/lib/model/quantity';
import { list } from './describe-structure';

/** What is taken out, in words. */
export function describeRedundants(redundants: readonly Quantity[]): string {
  if (redundants.length === 0) return 'Nothing is taken out.';
  return `Taken out: ${list(redundants.map((q, i) => `X${i + 1}, ${quantityInWords(q)}`))}.`;
}

const components = { x: 'the x reaction', y: 'the y reaction', turn: 'the fixing moment' };

export function quantityInWords(q: Quantity): string {
  switch (q.kind) {
    case 'reaction':
      return `${components[q.component]} at ${q.joint}`;
    case 'axial':
      return `the axial force of ${q.member}`;
    case 'moment':
      return `the moment at the ${q.end} of ${q.member}`;
  }
}
