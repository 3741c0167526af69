'use client';

import type { Block } from '@/templates/block';
import { DeltaMark } from '@/templates/screen/delta-mark';
import { SheetView } from '@/templates/screen/sheet-view';

interface Props {
  blocks: Block[];
  /** Line ids with the revision in which each last changed. */
  changedIn: [string, number][];
}

/** The lines of a revision as they were frozen; a line that changed since the first bears a triangle. */
export function FrozenSheet({ blocks, changedIn }: Props) {
  const changed = new Map(changedIn);
  return (
    <SheetView
      blocks={blocks}
      wideMargin
      delta={(block) => {
        const revision = changed.get(block.id);
        return revision === undefined ? null : <DeltaMark revision={revision} />;
      }}
    />
  );
}
