'use client';

import type { FieldError } from '@/lib/model/field-reader';
import { DrawingView } from '@/templates/screen/drawing-view';
import { SheetView } from '@/templates/screen/sheet-view';
import type { Writing } from './writing';

interface Props {
  sheet: string;
  writing: Writing | undefined;
  pages: Extract<Writing, { state: 'written' }> | undefined;
  late: boolean;
  errors: readonly FieldError[];
}

/** The same blocks that will be printed, as they stand after the last change that could be solved. */
export function LivePage({ sheet, writing, pages, late, errors }: Props) {
  const behind = writing !== undefined && writing.state !== 'written';
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
      </div>
      <div className={behind ? 'leaf behind' : 'leaf'}>
        {writing?.state === 'refused' ? (
          <div className="refused" role="status">
            <h2>Not solved</h2>
            <p>{writing.refusal.message}</p>
            {writing.drawing ? <DrawingView drawing={writing.drawing} /> : null}
          </div>
        ) : null}
        {pages ? (
          <SheetView blocks={pages.blocks} />
        ) : (
          <NotYet errors={errors} waiting={writing === undefined} />
        )}
      </div>
    </section>
  );
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
