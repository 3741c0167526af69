interface Props {
  line: string;
  /** Numbers of the comments at this line. */
  pins: number[];
  closed: boolean;
  onPick: () => void;
}

/** What stands in the margin at a line: its comments, and the button that comments on it. */
export function LinePins({ line, pins, closed, onPick }: Props) {
  return (
    <span className="pins">
      {pins.map((number) => (
        <span key={number} className="pin">
          <span className="sr-only">Comment </span>
          {number}
        </span>
      ))}
      {closed ? null : (
        <button type="button" className="pinhere" aria-label={`Comment on line ${line}`} onClick={onPick}>
          +
        </button>
      )}
    </span>
  );
}
