import type { SheetState } from '@/lib/services/sheet-state';
import { markWord, StatusMark } from './status-mark';

const order: SheetState[] = ['sealed', 'checked', 'checking', 'returned', 'frozen', 'draft'];

/** "4 sheets: 2 checked, 1 in checking, 1 draft". */
export function sayStates(states: SheetState[]): string {
  if (states.length === 0) return 'no sheets yet';
  const sheets = states.length === 1 ? '1 sheet' : `${states.length} sheets`;
  const counts = order
    .map((state) => ({ state, count: states.filter((s) => s === state).length }))
    .filter((c) => c.count > 0);
  const [only] = counts;
  if (counts.length === 1 && only) return `${sheets}, ${markWord(only.state)}`;
  return `${sheets}: ${counts.map((c) => `${c.count} ${markWord(c.state)}`).join(', ')}`;
}

/** The sheets of a job as a row of marks, and in words below. */
export function SheetStates({ sheets }: { sheets: { number: string; state: SheetState }[] }) {
  return (
    <div>
      <span className="marks">
        {sheets.map((sheet) => (
          <StatusMark key={sheet.number} mark={sheet.state} of={sheet.number} alone />
        ))}
      </span>
      <small className="i2">{sayStates(sheets.map((s) => s.state))}</small>
    </div>
  );
}
