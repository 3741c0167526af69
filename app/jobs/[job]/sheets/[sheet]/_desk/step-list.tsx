'use client';

import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';
import { type DeskStepKey, deskSteps, errorsOfStep } from './desk-step';
import { stepWords } from './step-words';
import type { Writing } from './writing';

interface Props {
  draft: Draft;
  current: DeskStepKey;
  onStep: (step: DeskStepKey) => void;
  errors: readonly FieldError[];
  writing: Writing | undefined;
}

/** The steps in the margin, each with what it still needs; any may be visited at any time. */
export function StepList({ draft, current, onStep, errors, writing }: Props) {
  return (
    <ol className="steps" aria-label="Steps">
      {deskSteps.map((step, i) => {
        const state = stepState(step.key, draft, errors, writing);
        return (
          <li key={step.key}>
            <button
              type="button"
              aria-current={step.key === current ? 'step' : undefined}
              onClick={() => onStep(step.key)}
            >
              <span className="lab">
                {step.title}
                <small>{state.words}</small>
              </span>
              <span className="no" aria-hidden="true">
                {i + 1}
              </span>
              <StepMark done={state.done} />
            </button>
          </li>
        );
      })}
    </ol>
  );
}

function stepState(
  step: DeskStepKey,
  draft: Draft,
  errors: readonly FieldError[],
  writing: Writing | undefined,
) {
  const open = errorsOfStep(errors, step).length;
  if (open > 0) return { done: false, words: open === 1 ? 'one field open' : `${open} fields open` };
  const later = step === 'redundants' || step === 'results' || step === 'checks';
  if (!later) return { done: true, words: stepWords(draft, step) };
  if (writing?.state === 'refused') return { done: false, words: 'not solved' };
  if (writing?.state !== 'written') return { done: false, words: 'waits' };
  switch (step) {
    case 'redundants':
      return { done: true, words: writing.proposed ? 'proposed set' : 'own set' };
    case 'results':
      return { done: true, words: `written in ${Math.max(1, Math.round(writing.milliseconds))} ms` };
    default: {
      const held = writing.checks.filter((c) => c.holds).length;
      return { done: held === writing.checks.length, words: `${held} of ${writing.checks.length} hold` };
    }
  }
}

/** A tick when complete, a broken circle while something is open. */
function StepMark({ done }: { done: boolean }) {
  return (
    <svg width="16" height="16" viewBox="0 0 16 16" className={done ? 'mk done' : 'mk'} aria-hidden="true">
      {done ? (
        <path d="M2.5 8.5 L6.5 12.5 L13.5 4" fill="none" stroke="currentColor" strokeWidth="1.6" />
      ) : (
        <circle
          cx="8"
          cy="8"
          r="5.6"
          fill="none"
          stroke="currentColor"
          strokeWidth="1.6"
          strokeDasharray="2.6 1.8"
        />
      )}
    </svg>
  );
}
