import { createElement } from 'react';
import type { Drawing, ShapeRef } from '@/lib/figures/drawing';
import type { FigureBlock } from '../block';
import { DrawingView } from './drawing-view';
import { RichText } from './rich-text';

interface Props {
  block: FigureBlock;
  lit?: ShapeRef;
  onLight?: (ref: ShapeRef | undefined) => void;
}

/** Drawings side by side with their caption; in a narrow column one under another, laid out for it where they can be. */
export function FigureView({ block, lit, onLight }: Props) {
  const { drawings, narrow, caption } = block;
  const row = (list: readonly Drawing[], className: string) =>
    createElement(
      'div',
      { className: `drawings ${className}` },
      ...list.map((drawing) => createElement(DrawingView, { drawing, lit, onLight })),
    );
  return (
    <figure>
      {row(drawings, narrow ? 'when-wide' : '')}
      {narrow ? row(narrow, 'when-narrow') : null}
      <figcaption>
        <RichText text={caption} />
      </figcaption>
    </figure>
  );
}
