import Link from 'next/link';
import type { readAudit } from '@/lib/services/read-audit';
import { Hung } from './ledger';
import { sayDate } from './say-date';
import { sayTime } from './say-time';

type Read = Awaited<ReturnType<typeof readAudit>>;

/** Entries of the record, newest first, each with who, what and the digest of what it was done to. */
export function RecordList({
  read,
  zone,
  hrefOf,
}: {
  read: Read;
  zone: string;
  hrefOf: (page: number) => string;
}) {
  if (read.entries.length === 0)
    return (
      <Hung>
        <p className="i2">No entry is about this.</p>
      </Hung>
    );
  return (
    <>
      <ol className="ruledlist record">
        {read.entries.map((entry) => (
          <li key={entry.hash}>
            <Hung number={sayTime(entry.at, zone)}>
              <p>
                <b className="font-medium">{entry.person}</b> {entry.verb}{' '}
                <span className="[overflow-wrap:anywhere]">{entry.subject}</span>
              </p>
              <small className="i2 block [overflow-wrap:anywhere]">
                {sayDate(entry.at, zone)}
                {entry.digest ? `, digest ${entry.digest}` : ''}, entry {entry.hash.slice(0, 12)}
              </small>
            </Hung>
          </li>
        ))}
      </ol>
      {read.page > 1 || read.more ? (
        <Hung at="section">
          <nav className="row" aria-label="Pages of the record">
            {read.page > 1 ? (
              <Link className="btn s" href={hrefOf(read.page - 1)}>
                Newer
              </Link>
            ) : null}
            <span className="i2">Page {read.page}</span>
            {read.more ? (
              <Link className="btn s" href={hrefOf(read.page + 1)}>
                Older
              </Link>
            ) : null}
          </nav>
        </Hung>
      ) : null}
    </>
  );
}
