'use client';

import { useCallback, useEffect, useState } from 'react';
import { type DeskStepKey, stepOfPath } from './desk-step';

export type Zone = 'steps' | 'form' | 'page';

/** Where one is on the desk: the step, the part shown on a narrow screen, the load case, the field in hand. */
export function usePlace() {
  const [step, setStep] = useState<DeskStepKey>('geometry');
  const [zone, setZone] = useState<Zone>('form');
  const [caseIndex, setCase] = useState(0);
  const [goal, setGoal] = useState<{ path: string } | undefined>();

  // The field exists only after its step is on the screen.
  useEffect(() => {
    if (!goal) return;
    const fields = [...document.querySelectorAll<HTMLElement>('.deskmain [data-path]')];
    const exact = fields.find((f) => f.dataset.path === goal.path);
    const within = fields.find((f) => f.dataset.path?.startsWith(rowOf(goal.path)));
    (exact ?? within)?.focus();
  }, [goal]);

  const goStep = useCallback((to: DeskStepKey) => {
    setStep(to);
    setZone('form');
  }, []);
  const goTo = useCallback(
    (path: string) => {
      const at = /^cases\.(\d+)/.exec(path)?.[1];
      if (at !== undefined) setCase(Number(at));
      goStep(stepOfPath(path));
      setGoal({ path });
    },
    [goStep],
  );
  return { step, goStep, zone, setZone, caseIndex, setCase, goTo };
}

/** "cases.0.loads.3." of "cases.0.loads.3.first". */
const rowOf = (path: string): string => path.slice(0, path.lastIndexOf('.') + 1) || path;
