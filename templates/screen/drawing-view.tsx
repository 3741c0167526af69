import { createElement, Fragment, memo } from 'react';
import type { Drawing, Shape, ShapeRef } from '@/lib/figures/drawing';
import { DrawingLabel } from './drawing-label';

interface Props {
  drawing: Drawing;
  /** The thing in hand: its shapes are lit. */
  lit?: ShapeRef;
  /** Told what the pointer or the focus is on; undefined when it leaves. */
  onLight?: (ref: ShapeRef | undefined) => void;
  /** Told what was clicked; the same must be reachable by a button elsewhere, since a drawing takes no focus. */
  onPick?: (ref: ShapeRef) => void;
  className?: string;
}

/** A drawing as inline SVG: one point is 1/72 in, as on paper, and it shrinks with its column but never grows. */
export const DrawingView = memo(function DrawingView(props: Props) {
  const { drawing, lit, onLight, onPick, className } = props;
  const { width, height, shapes, alt } = drawing;
  const light = onLight && {
    onPointerOver: (event: React.PointerEvent<SVGSVGElement>) => onLight(refAt(event.target)),
    onPointerLeave: () => onLight(undefined),
  };
  const pick = onPick && {
    onClick: (event: React.MouseEvent<SVGSVGElement>) => {
      const ref = refAt(event.target);
      if (ref) onPick(ref);
    },
  };
  // Shapes have no identity of their own; their order is what they are known by.
  const drawn = shapes.map((shape) => createElement(ShapeView, { shape, lit: isLit(shape.ref, lit) }));
  return (
    <svg
      className={`fig${className ? ` ${className}` : ''}`}
      role="img"
      aria-label={alt}
      viewBox={`0 0 ${width} ${height}`}
      style={{ width: `${width}pt` }}
      {...light}
      {...pick}
    >
      {createElement(Fragment, null, ...drawn)}
      {onLight ? createElement(Fragment, null, ...shapes.map(hitArea)) : null}
    </svg>
  );
});

function ShapeView({ shape, lit }: { shape: Shape; lit: boolean }) {
  const ref = shape.ref && { 'data-of': shape.ref.of, 'data-id': shape.ref.id };
  if (shape.kind === 'label') return <DrawingLabel label={shape} className={lit ? 'lit' : ''} />;
  const { stroke, fill, width, dash } = shape;
  const look = {
    className: `line-${stroke ?? 'none'} fill-${fill ?? 'none'}${lit ? ' lit' : ''}`,
    strokeWidth: stroke ? (width ?? 1) : undefined,
    strokeDasharray: dash?.join(' '),
    ...ref,
  };
  switch (shape.kind) {
    case 'line':
      return <line x1={shape.x1} y1={shape.y1} x2={shape.x2} y2={shape.y2} {...look} />;
    case 'poly': {
      const points = shape.points.map((p) => p.join(',')).join(' ');
      return shape.closed ? <polygon points={points} {...look} /> : <polyline points={points} {...look} />;
    }
    case 'path':
      return <path d={shape.d} {...look} />;
    case 'circle':
      return <circle cx={shape.cx} cy={shape.cy} r={shape.r} {...look} />;
  }
}

/** A member is a thin line, a joint a dot: what the pointer meets is a broad one over it, not seen. */
function hitArea(shape: Shape) {
  if (shape.kind === 'circle' && shape.ref?.of === 'joint') {
    const { cx, cy, ref } = shape;
    return createElement('circle', { cx, cy, r: 9, className: 'hit', 'data-of': ref.of, 'data-id': ref.id });
  }
  if (shape.kind !== 'line' || shape.ref?.of !== 'member') return null;
  const { x1, y1, x2, y2, ref } = shape;
  return createElement('line', { x1, y1, x2, y2, className: 'hit', 'data-of': ref.of, 'data-id': ref.id });
}

/** A support is lit with its joint. */
const isLit = (ref: ShapeRef | undefined, lit: ShapeRef | undefined): boolean =>
  ref !== undefined && lit !== undefined && placeOf(ref) === placeOf(lit) && ref.id === lit.id;

const placeOf = (ref: ShapeRef): ShapeRef['of'] => (ref.of === 'support' ? 'joint' : ref.of);

function refAt(target: EventTarget): ShapeRef | undefined {
  const marked = target instanceof SVGElement ? target.closest<SVGElement>('[data-of]') : null;
  if (!marked) return undefined;
  const { of, id } = marked.dataset;
  const known = refs.find((kind) => kind === of);
  return known && id !== undefined ? { of: known, id } : undefined;
}

const refs = ['member', 'joint', 'load', 'support', 'redundant'] as const;
