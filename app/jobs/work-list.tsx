import Link from 'next/link';
import type { Work } from '@/lib/services/my-work';
import { Hung, Ledger, LedgerRow } from '../components/ledger';

interface WorkListProps {
  title: string;
  nothing: string;
  work: Work[];
  first?: boolean;
}

/** What waits, the longest first; what is late says so in words. */
export function WorkList({ title, nothing, work, first = false }: WorkListProps) {
  const late = work.filter((w) => w.late).length;
  return (
    <>
      <Hung at={first ? 'first' : 'section'}>
        <h2>
          {title}
          {late > 0 ? <span className="i2 font-normal">, {late} late</span> : null}
        </h2>
        {work.length === 0 ? <p className="i2">{nothing}</p> : null}
      </Hung>
      {work.length > 0 ? (
        <Ledger kind="work">
          {work.map((w) => (
            <LedgerRow key={`${w.href} ${w.text}`} number={w.late ? <b>late</b> : undefined}>
              <Link className="t justify-self-start" href={w.href}>
                {w.text}
              </Link>
              <span className="i2">
                {w.job}, {sayDays(w.days)}
              </span>
            </LedgerRow>
          ))}
        </Ledger>
      ) : null}
    </>
  );
}

function sayDays(days: number): string {
  if (days <= 0) return 'since today';
  return days === 1 ? 'for one day' : `for ${days} days`;
}
