import { createElement, memo, type ReactNode } from 'react';
import type { ShapeRef } from '@/lib/figures/drawing';
import type { Block } from '../block';
import { EquationView } from './equation-view';
import { FigureView } from './figure-view';
import { RichText } from './rich-text';
import { TableView } from './table-view';

export interface BlockProps {
  block: Block;
  /** The line in hand: washed, with the pen's bar on the rule. */
  on?: boolean;
  /** Stands in the margin left of the number: the triangle of a changed line. */
  delta?: ReactNode;
  /** Stands at the margin's outer edge: ticks, crosses, queries, pins. */
  marks?: ReactNode;
  /** Stands under the block, inside the rule: an answer, a comment being written. */
  after?: ReactNode;
  lit?: ShapeRef;
  onLight?: (ref: ShapeRef | undefined) => void;
}

/**
 * One numbered line of a sheet: number, source and marks outside the double rule, the work inside. A line whose block
 * is the same object as before is not set again.
 */
export const BlockView = memo(function BlockView(props: BlockProps) {
  const { block, on, delta, marks, after, lit, onLight } = props;
  const source = 'source' in block ? block.source : undefined;
  return (
    <div className={`blk ${block.kind}${on ? ' on' : ''}`} id={`line-${block.id}`} data-line={block.id}>
      <div className="no">
        {marks === undefined ? null : <span className="marks">{marks}</span>}
        {delta}
        <span>{block.id}</span>
      </div>
      {source === undefined ? null : (
        <div className="src">
          <RichText text={source} />
        </div>
      )}
      <div className="bd">
        <BlockBody block={block} lit={lit} onLight={onLight} />
        {after}
      </div>
    </div>
  );
});

function BlockBody({ block, lit, onLight }: Pick<BlockProps, 'block' | 'lit' | 'onLight'>) {
  switch (block.kind) {
    case 'heading':
      return (
        <h2>
          <RichText text={block.text} />
        </h2>
      );
    case 'paragraph':
      return (
        <p>
          <RichText text={block.text} />
        </p>
      );
    case 'equations': {
      const rows = block.rows.map((row) => createElement(EquationView, { row }));
      return (
        <>
          {block.text === undefined ? null : (
            <p>
              <RichText text={block.text} />
            </p>
          )}
          {createElement('div', { className: 'eqs' }, ...rows)}
        </>
      );
    }
    case 'figure':
      return <FigureView block={block} lit={lit} onLight={onLight} />;
    case 'table':
      return <TableView block={block} />;
    case 'caution':
      return (
        <p role="note" className="cautiontext">
          <RichText text={block.text} />
        </p>
      );
  }
}
