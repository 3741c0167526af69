import { createElement, type ReactNode } from 'react';

interface Props {
  label: string;
  className: string;
  /** Whether nothing inside takes the focus, so that the part itself must, to be scrolled by keyboard. */
  focusable: boolean;
  children: ReactNode;
}

/** A part of the screen that scrolls by itself. */
export function ReadingPage({ label, className, focusable, children }: Props) {
  return createElement(
    'section',
    { className, 'aria-label': label, tabIndex: focusable ? 0 : undefined },
    children,
  );
}
