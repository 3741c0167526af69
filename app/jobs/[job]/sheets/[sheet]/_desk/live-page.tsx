'use client';

import { useEffect, useId, useRef, useState } from 'react';
import type { FieldError } from '@/lib/model/field-reader';
import { DrawingView } from '@/templates/screen/drawing-view';
import { SheetView } from '@/templates/screen/sheet-view';
import { useDesk } from './desk-context';
import type { DeskStepKey } from './desk-step';
import { findLine } from './find-line';
import type { Writing, WrittenPages } from './writing';

interface Props {
  sheet: string;
  step: DeskStepKey;
  caseIndex: number;
  writing: Writing | undefined;
  pages: WrittenPages | undefined;
  late: boolean;
  errors: readonly FieldError[];
}

/** The same blocks that will be printed, as they stand after the last change that could be solved. */
export function LivePage({ sheet, step, caseIndex, writing, pages, late, errors }: Props) {
  const { draft, lit, light } = useDesk();
  const followId = useId();
  const leaf = useRef<HTMLDivElement>(null);
  const [follow, setFollow] = useState(true);
  const behind = writing !== undefined && writing.state !== 'written';
  const chosen = draft.cases[caseIndex];
  const caseTitle = chosen && `Case ${chosen.id},`;
  const line = pages && findLine(pages.blocks, step, lit, caseTitle);

  useEffect(() => {
    const page = leaf.current;
    if (!follow || !page || line === undefined) return;
    const target = page.querySelector(`[data-line="${line}"]`);
    if (target) keepInView(page, target);
  }, [follow, line]);

  return (
    <section className="live" aria-label="Live page">
      <div className="livehead">
        <span>
          Sheet <b>{sheet}</b>
        </span>
        <span role="status">
          {late ? 'The server does not answer; the page is the last one written.' : null}
          {!late && behind && pages ? 'The page is the last one that could be solved.' : null}
        </span>
        <label htmlFor={followId} className="follow">
          <input
            id={followId}
            type="checkbox"
            checked={follow}
            onChange={(e) => setFollow(e.target.checked)}
          />
          Follow the form
        </label>
      </div>
      <div className={behind ? 'leaf behind' : 'leaf'} ref={leaf}>
        {writing?.state === 'refused' ? (
          <div className="refused" role="status">
            <h2>Not solved</h2>
            <p>{writing.refusal.message}</p>
            {writing.drawing ? <DrawingView drawing={writing.drawing} /> : null}
          </div>
        ) : null}
        {pages ? (
          <SheetView blocks={pages.blocks} lit={lit} onLight={light} />
        ) : (
          <NotYet errors={errors} waiting={writing === undefined} />
        )}
      </div>
    </section>
  );
}

/** Scrolls the leaf, and only the leaf, when less than all of the target can be seen. */
function keepInView(leaf: HTMLElement, target: Element): void {
  const [frame, box] = [leaf.getBoundingClientRect(), target.getBoundingClientRect()];
  if (box.top >= frame.top && box.bottom <= frame.bottom) return;
  const still = window.matchMedia('(prefers-reduced-motion: reduce)').matches;
  leaf.scrollTo({
    top: leaf.scrollTop + box.top - frame.top - 24,
    behavior: still ? 'auto' : 'smooth',
  });
}

function NotYet({ errors, waiting }: { errors: readonly FieldError[]; waiting: boolean }) {
  if (waiting) return <p className="notyet">Being written …</p>;
  if (errors.length === 0) return null;
  return (
    <div className="notyet">
      <p>The page is written as soon as these are there:</p>
      <ul>
        {errors.slice(0, 8).map((e) => (
          <li key={e.path}>{e.message}</li>
        ))}
      </ul>
      {errors.length > 8 ? <p>and {errors.length - 8} more.</p> : null}
    </div>
  );
}
