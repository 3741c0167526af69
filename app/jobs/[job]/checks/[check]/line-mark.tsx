import { StatusMark } from '@/app/components/status-mark';
import type { CheckMark } from './check-mark';

interface Props {
  line: string;
  mark: CheckMark | undefined;
  /** Takes the line in hand; absent for those who only read. */
  onPick: ((line: string) => void) | undefined;
}

/** What stands in the margin at a line: its mark, and the button that takes it in hand. */
export function LineMark({ line, mark, onPick }: Props) {
  return (
    <span className="linemark">
      {mark ? <StatusMark mark={mark.kind} alone of={`Line ${line}`} /> : null}
      {onPick ? (
        <button
          type="button"
          className="linepick"
          aria-label={`Take line ${line} in hand`}
          onClick={() => onPick(line)}
        >
          ›
        </button>
      ) : null}
    </span>
  );
}
