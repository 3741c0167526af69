import { sayMoment } from '@/app/components/say-date';
import type { openCheck } from '@/lib/services/open-check';
import type { CheckMark } from './check-mark';

type Opened = Awaited<ReturnType<typeof openCheck>>['marks'];

/** The marks of a check with their times in words. */
export function showMarks(marks: Opened, zone: string): CheckMark[] {
  return marks.map(({ at: _at, steps, ...mark }) => ({
    ...mark,
    steps: steps.map((s) => ({ ...s, at: sayMoment(s.at, zone) })),
  }));
}
