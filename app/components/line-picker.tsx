'use client';

import { type ReactNode, useEffect, useRef } from 'react';

interface Props {
  onPick: (line: string) => void;
  children: ReactNode;
}

/** Picks the line of a sheet that is pressed anywhere on it. By keyboard each line has a button of its own. */
export function LinePicker({ onPick, children }: Props) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const node = box.current;
    const pick = (event: MouseEvent) => {
      if (!(event.target instanceof Element) || event.target.closest('a, button, input, select, textarea'))
        return;
      const line = event.target.closest<HTMLElement>('[data-line]')?.dataset.line;
      if (line !== undefined) onPick(line);
    };
    node?.addEventListener('click', pick);
    return () => node?.removeEventListener('click', pick);
  }, [onPick]);
  return <div ref={box}>{children}</div>;
}
