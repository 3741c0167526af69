import Link from 'next/link';
import type { ReactNode } from 'react';
import { FrontDrawing } from './front-drawing';

interface TitlePageProps {
  title: string;
  lead: ReactNode;
  demo?: boolean;
  children: ReactNode;
}

/** The page of those who are not signed in: the mark, a title, one form, and a piece of a calculation. */
export function TitlePage({ title, lead, demo = false, children }: TitlePageProps) {
  return (
    <div className="signpage relative">
      <div className="dbl" />
      <div className="bigf" aria-hidden="true" />
      <main className="title" id="main">
        <h1 className={title === 'Fairhand' ? undefined : 'smaller'}>{title}</h1>
        <p className="lead">{lead}</p>
        {children}
      </main>
      <FrontDrawing />
      <footer className="imprint">
        <span>Fairhand</span>
        {demo ? (
          <span>
            <Link className="t" href="/demo/mail">
              Mail of this demonstration
            </Link>
          </span>
        ) : null}
        <span className="end">A licensed engineer answers for every calculation; local codes govern.</span>
      </footer>
    </div>
  );
}
