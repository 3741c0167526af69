import type { CSSProperties, ReactNode } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Block } from '../block';
import { BlockView } from './block-view';
import { equalsColumn } from './equals-column';

export interface SheetProps {
  blocks: readonly Block[];
  /** Id of the line in hand. */
  on?: string;
  /** What stands beside, in the margin of, and under a line; see BlockView. */
  delta?: (block: Block) => ReactNode;
  marks?: (block: Block) => ReactNode;
  after?: (block: Block) => ReactNode;
  lit?: ShapeRef;
  onLight?: (ref: ShapeRef | undefined) => void;
  /** A wide margin for marks beside the numbers, as for checking and review. */
  wideMargin?: boolean;
}

/** A sheet, or some pages of it: every line in the one margin, the equals signs in one column. */
export function SheetView({ blocks, on, delta, marks, after, lit, onLight, wideMargin }: SheetProps) {
  const style = { '--lhs': `${equalsColumn(blocks)}em` } as CSSProperties;
  return (
    <div className={`sheet${wideMargin ? ' wide-margin' : ''}`} style={style}>
      <div className="lines">
        {blocks.map((block) => (
          <BlockView
            key={block.id}
            block={block}
            on={block.id === on}
            delta={delta?.(block)}
            marks={marks?.(block)}
            after={after?.(block)}
            lit={block.kind === 'figure' ? lit : undefined}
            onLight={onLight}
          />
        ))}
      </div>
    </div>
  );
}
