import type { KindName } from '@/lib/units/kind';
import type { DraftLoad } from './draft';

/** What the two value fields of a load row hold; undefined: the row has no such field. */
export function loadFieldKinds(row: Pick<DraftLoad, 'kind' | 'direction'>): {
  first: KindName | undefined;
  second: KindName | undefined;
} {
  const turning = row.direction === 'clockwise' || row.direction === 'counter-clockwise';
  switch (row.kind) {
    case 'uniform':
      return { first: 'distributed', second: undefined };
    case 'varying':
      return { first: 'distributed', second: 'distributed' };
    case 'point':
      return { first: 'force', second: undefined };
    case 'couple':
      return { first: 'couple', second: undefined };
    case 'joint':
      return { first: turning ? 'couple' : 'force', second: undefined };
    case 'settlement':
      return { first: turning ? 'rotation' : 'movement', second: undefined };
    case 'temperature':
      return { first: 'temperature', second: 'temperature' };
    case 'misfit':
      return { first: 'movement', second: undefined };
    case 'self-weight':
      return { first: undefined, second: undefined };
  }
}
