'use client';

import type { Block } from '@/templates/block';
import { SheetView } from '@/templates/screen/sheet-view';

/** The lines of a revision as they were frozen. */
export function FrozenSheet({ blocks }: { blocks: Block[] }) {
  return <SheetView blocks={blocks} wideMargin />;
}
