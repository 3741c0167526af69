import type { Block } from './block';
import { compareBlocks } from './compare-blocks';

/** The state of a sheet at one revision. */
export interface RevisionLines {
  number: number;
  blocks: readonly Block[];
}

/**
 * The revision in which each line of the newest state last changed, by line id; lines that are as in the first state
 * are absent. `revisions` from the first to the newest.
 */
export function lastChanged(revisions: readonly RevisionLines[]): Map<string, number> {
  const [first, ...later] = revisions;
  let known = new Map<string, number>();
  let before = first;
  for (const revision of later) {
    const next = new Map<string, number>();
    for (const { before: was, after: is, same } of compareBlocks(before?.blocks ?? [], revision.blocks)) {
      if (!is) continue;
      const number = same && was ? known.get(was.id) : revision.number;
      if (number !== undefined) next.set(is.id, number);
    }
    known = next;
    before = revision;
  }
  return known;
}
