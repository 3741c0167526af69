import type { ReactNode } from 'react';

const shapes = {
  draft: <circle cx="8" cy="8" r="5.7" strokeDasharray="2.6 2.35" />,
  frozen: <path d="M2.8 2.8h10.4v10.4H2.8Z" />,
  checking: (
    <>
      <circle cx="8" cy="8" r="5.7" />
      <path d="M8 2.3a5.7 5.7 0 0 1 0 11.4z" fill="currentColor" stroke="none" />
    </>
  ),
  checked: (
    <>
      <circle cx="8" cy="8" r="6.2" />
      <path d="M4.9 8.3 7.2 10.6 11.3 5.5" />
    </>
  ),
  returned: <path d="M13.4 12.6V8.6a3 3 0 0 0-3-3H3.2M6.4 2.2 3 5.6 6.4 9" />,
  sealed: (
    <>
      <circle cx="8" cy="8" r="6.4" />
      <circle cx="8" cy="8" r="3.5" />
    </>
  ),
  issued: <path d="M2.6 2.4v11.2M2.6 8h10.6M9.4 4.2 13.2 8l-3.8 3.8" />,
  void: (
    <>
      <circle cx="8" cy="8" r="5.7" />
      <path d="M4 12 12 4" />
    </>
  ),
  agrees: <path d="M2.6 8.8 6.4 12.6 13.6 3.4" />,
  correct: <path d="M3.4 3.4 12.6 12.6M12.6 3.4 3.4 12.6" />,
  query: (
    <>
      <path d="M5.1 5.6a2.95 2.95 0 1 1 4.5 2.5c-1 .62-1.6 1.1-1.6 2.4" />
      <circle cx="8" cy="13.2" r="1.05" fill="currentColor" stroke="none" />
    </>
  ),
  open: <path d="M2.5 3h11v8H8l-3.2 2.6V11H2.5Z" />,
  answered: <path d="M2.5 3h11v8H8l-3.2 2.6V11H2.5ZM5.2 7h5.6" />,
  accepted: <path d="M2.5 3h11v8H8l-3.2 2.6V11H2.5ZM5.2 6.9l2 1.9 3.6-3.9" />,
  reopened: <path d="M12.9 6.2A5.3 5.3 0 1 0 13.3 9M13.4 2.4v4H9.4" />,
} satisfies Record<string, ReactNode>;

export type Mark = keyof typeof shapes;

const words: Record<Mark, string> = {
  draft: 'draft',
  frozen: 'frozen',
  checking: 'in checking',
  checked: 'checked',
  returned: 'returned',
  sealed: 'sealed',
  issued: 'issued',
  void: 'void',
  agrees: 'agrees',
  correct: 'correct this',
  query: 'query',
  open: 'open',
  answered: 'answered',
  accepted: 'accepted',
  reopened: 're-opened',
};

interface StatusMarkProps {
  mark: Mark;
  /** Alone the mark keeps its word for screen readers only. */
  alone?: boolean;
  /** A word in place of the usual one. */
  word?: string;
  /** A name in front of the word when the mark stands alone, such as "S-03". */
  of?: string;
}

/** A state or a mark: a shape that reads in grey, and its word. */
export function StatusMark({ mark, alone = false, word = words[mark], of }: StatusMarkProps) {
  return (
    <span className={`st ${mark}`} title={alone ? [of, word].filter(Boolean).join(' ') : undefined}>
      <svg className="mk" viewBox="0 0 16 16" width="16" height="16" aria-hidden="true">
        <g fill="none" stroke="currentColor" strokeWidth="1.6">
          {shapes[mark]}
        </g>
      </svg>
      <span className={alone ? 'sr-only' : undefined}>{alone && of ? `${of} ${word}` : word}</span>
    </span>
  );
}

export function markWord(mark: Mark): string {
  return words[mark];
}
