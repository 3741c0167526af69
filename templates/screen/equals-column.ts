import type { Block } from '../block';
import { layOutLabel } from './lay-out-label';

/** A left-hand side longer than this, em, stands out to the right of the column by itself. */
const longest = 7;

/** Width of the left-hand sides of a sheet, em: its equals signs stand in one column. */
export function equalsColumn(blocks: readonly Block[]): number {
  let width = 0;
  for (const block of blocks) {
    if (block.kind !== 'equations') continue;
    for (const { lhs, chain } of block.rows) {
      const own = chain.length > 0 ? widthOf(lhs) : 0;
      if (own <= longest) width = Math.max(width, own);
    }
  }
  return Math.round(width * 100) / 100;
}

function widthOf(tex: string): number {
  try {
    return layOutLabel(`$\\displaystyle ${tex}$`).width;
  } catch {
    // TeX that cannot be set is shown as written and takes no part in the column.
    return 0;
  }
}
