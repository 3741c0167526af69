import { Children, isValidElement, type ReactNode } from 'react';
import type { Actor } from '@/lib/services/actor';
import { PageHead, type PathPart } from './page-head';

interface PageProps {
  path: PathPart[];
  actor?: Pick<Actor, 'name' | 'initials'>;
  /** What stands in the margin; a wide page sets its own margin row by row. */
  margin?: ReactNode;
  wide?: boolean;
  /** Parts of the foot line, in order. */
  foot: ReactNode[];
  children: ReactNode;
}

/** The page that every screen is: head, margin outside the double rule, work inside it, foot line. */
export function Page({ path, actor, margin, wide = false, foot, children }: PageProps) {
  return (
    <div className={wide ? 'book wide' : 'book'}>
      <PageHead path={path} actor={actor} />
      {wide ? null : <aside className="margin">{margin}</aside>}
      <main id="main">{children}</main>
      <footer className="imprint">
        {Children.map(foot, (part) => (isValidElement(part) ? part : <span>{part}</span>))}
      </footer>
    </div>
  );
}
