import type { Block } from '@/templates/block';

/**
 * The new blocks, with the old object wherever a line says the same as before: what did not change keeps its identity,
 * and is neither typeset nor drawn again.
 */
export function keepBlocks(before: readonly Block[], after: readonly Block[]): Block[] {
  const known = new Map(before.map((b) => [b.id, b]));
  return after.map((block) => {
    const old = known.get(block.id);
    return old && JSON.stringify(old) === JSON.stringify(block) ? old : block;
  });
}
