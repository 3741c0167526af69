import { createElement, Fragment } from 'react';
import type { LabelShape } from '@/lib/figures/drawing';
import { type LabelRun, layOutLabel } from './lay-out-label';
import { splitRichText } from './split-rich-text';

const digits = (v: number): number => Math.round(v * 1000) / 1000;

/** A label as SVG text in KaTeX's faces, each run set off from where the one before it ends. */
export function DrawingLabel({ label, className }: { label: LabelShape; className: string }) {
  const { x, y, size, anchor, turn } = label;
  let end = { x: 0, y: 0 };
  const spans = runsOf(label.text).map((run) => {
    const [dx, dy] = [digits((run.x - end.x) * size), digits((end.y - run.y) * size)];
    end = { x: run.x + run.width, y: run.y };
    const className = `face-${run.face}${run.italic ? ' it' : ''}${run.bold ? ' bd' : ''}`;
    const fontSize = run.size === 1 ? undefined : digits(run.size * size);
    return createElement(
      'tspan',
      { className, dx: dx || undefined, dy: dy || undefined, fontSize },
      run.text,
    );
  });
  return (
    <text
      className={`${className} fill-${label.tone ?? 'ink'}${label.halo ? ' halo' : ''}`}
      data-of={label.ref?.of}
      data-id={label.ref?.id}
      fontSize={size}
      textAnchor={anchor}
      transform={turn ? `rotate(${-turn} ${x} ${y})` : undefined}
      x={x}
      y={y}
    >
      {createElement(Fragment, null, ...spans)}
    </text>
  );
}

/** What cannot be set as a label (its TeX is wrong) is shown as it was written. */
function runsOf(text: string): readonly LabelRun[] {
  try {
    return layOutLabel(text).runs;
  } catch {
    const words = splitRichText(text)
      .map((piece) => piece.text)
      .join('');
    return [{ text: words, face: 'words', bold: false, italic: false, size: 0.885, x: 0, y: 0, width: 0 }];
  }
}
