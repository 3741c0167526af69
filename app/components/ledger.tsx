import type { ReactNode } from 'react';

interface LedgerRowProps {
  /** What hangs outside the rule: a number, a date, a mark. */
  number?: ReactNode;
  children: ReactNode;
}

/** A list of ruled rows whose numbers hang outside the rule; for wide pages. */
export function Ledger({ kind, children }: { kind?: 'work' | 'jobs' | 'sheetsl'; children: ReactNode }) {
  return <ol className={kind ? `ruledlist ${kind}` : 'ruledlist'}>{children}</ol>;
}

export function LedgerRow({ number, children }: LedgerRowProps) {
  return (
    <li>
      <Hung number={number}>{children}</Hung>
    </li>
  );
}

/** Anything on a wide page with its number outside the rule; the top of the page and its sections. */
export function Hung({ number, at, children }: LedgerRowProps & { at?: 'top' | 'first' | 'section' }) {
  const place = at === 'top' ? ' top' : at === 'first' ? ' sec first' : at === 'section' ? ' sec' : '';
  return (
    <div className={`lr${place}`}>
      <div className="mg">{at === 'top' && number ? <span className="bigno">{number}</span> : number}</div>
      <div className="bd">{children}</div>
    </div>
  );
}
