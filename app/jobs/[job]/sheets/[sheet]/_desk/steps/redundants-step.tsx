'use client';

import { useState, useTransition } from 'react';
import type { Quantity } from '@/lib/model/quantity';
import { DrawingView } from '@/templates/screen/drawing-view';
import { RichText } from '@/templates/screen/rich-text';
import { useDesk } from '../desk-context';
import type { QuantityChoice, Trial, Writing } from '../writing';

interface Props {
  writing: Writing | undefined;
  pages: Extract<Writing, { state: 'written' }> | undefined;
  tryOut: (quantities: Quantity[]) => Promise<Trial>;
}

/** Which forces are released: the proposed set or another, chosen one quantity at a time. */
export function RedundantsStep({ writing, pages, tryOut }: Props) {
  const { draft, edit } = useDesk();
  const [trial, setTrial] = useState<{ chosen: QuantityChoice[]; answer: Trial } | undefined>();
  const [waiting, start] = useTransition();
  if (!pages) {
    const said =
      writing?.state === 'refused'
        ? writing.refusal.message
        : 'The choice opens when geometry and supports are complete.';
    return <p className="ans">{said}</p>;
  }
  if (pages.degree === 0) {
    return (
      <p>
        The structure is statically determinate: equilibrium alone gives every force, and nothing is released.
      </p>
    );
  }
  const exchange = (index: number, key: string) => {
    const next = pages.choices.find((c) => c.key === key);
    if (!next) return;
    const chosen = pages.redundants.map((r, i) => (i === index ? next : r));
    start(async () => {
      const answer = await tryOut(chosen.map((c) => c.quantity));
      setTrial({ chosen, answer });
      if (answer.good)
        edit(
          'redundants',
          chosen.map((c) => c.quantity),
        );
    });
  };
  const refused = trial && !trial.answer.good ? trial : undefined;
  return (
    <>
      <p>
        The structure is indeterminate to degree <span className="num">{pages.degree}</span>:{' '}
        {pages.degree === 1 ? 'one force is' : `${pages.degree} forces are`} released.{' '}
        {draft.redundants ? 'The set is your own.' : 'The set is the proposed one.'} Condition{' '}
        <span className="num">{pages.condition.toFixed(2)}</span>.
      </p>
      {pages.primary ? <DrawingView drawing={pages.primary} className="mt-2" /> : null}
      <ol className="plainlist" aria-busy={waiting}>
        {pages.redundants.map((r, i) => (
          <li key={r.key} className="flex items-baseline gap-3">
            <span className="num w-8">X{i + 1}</span>
            <select
              aria-label={`Redundant X${i + 1}`}
              className="setpick"
              value={r.key}
              onChange={(e) => exchange(i, e.target.value)}
            >
              {pages.choices.map((c) => (
                <option
                  key={c.key}
                  value={c.key}
                  disabled={c.key !== r.key && pages.redundants.some((o) => o.key === c.key)}
                >
                  {c.words}
                </option>
              ))}
            </select>
            <RichText text={r.symbol} />
          </li>
        ))}
      </ol>
      {draft.redundants ? (
        <button type="button" className="linkish" onClick={() => edit('redundants', undefined)}>
          Go back to the proposed set
        </button>
      ) : null}
      {refused && !refused.answer.good ? (
        <section className="refused" aria-label="Refused choice" role="status">
          <h3>Refused: {refused.chosen.map((c) => c.words).join(', ')}</h3>
          <p>{refused.answer.message}</p>
          {refused.answer.drawing ? <DrawingView drawing={refused.answer.drawing} /> : null}
        </section>
      ) : null}
      <FixedByEquilibrium pages={pages} />
    </>
  );
}

function FixedByEquilibrium({ pages }: { pages: Extract<Writing, { state: 'written' }> }) {
  if (pages.fixed.length === 0) return null;
  return (
    <section className="mt-5" aria-label="Fixed by equilibrium">
      <h3>Fixed by equilibrium</h3>
      <p className="ans">No choice of redundants changes these, so none of them can be one.</p>
      <ul className="plainlist">
        {pages.fixed.map((f) => (
          <li key={f.key}>
            <RichText text={f.symbol} />{' '}
            <span className="text-ink2">{f.values.map((v) => `${v.case}: ${v.value}`).join('; ')}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
