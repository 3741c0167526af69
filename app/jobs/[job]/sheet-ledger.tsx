import Link from 'next/link';
import type { openJob } from '@/lib/services/open-job';
import { Hung, Ledger, LedgerRow } from '../../components/ledger';
import { sayMoment } from '../../components/say-date';
import { StatusMark } from '../../components/status-mark';
import { CopyForm } from './copy-form';

type Sheet = Awaited<ReturnType<typeof openJob>>['sheets'][number];

interface SheetLedgerProps {
  jobId: string;
  sheets: Sheet[];
  zone: string;
  mayMake: boolean;
}

/** The sheets of a job: state, revision, people, and the frozen revision and check where there is one. */
export function SheetLedger({ jobId, sheets, zone, mayMake }: SheetLedgerProps) {
  return (
    <>
      <Hung>
        <div className="ledger head2">
          <span>Sheet</span>
          <span>State</span>
          <span>Rev</span>
          <span>Originator</span>
          <span>Checker</span>
          <span className="cch">Changed</span>
          <span />
        </div>
      </Hung>
      <Ledger kind="sheetsl">
        {sheets.map((sheet) => (
          <LedgerRow key={sheet.id} number={sheet.number}>
            <div className="ledger">
              <span className="c1">
                <b>
                  <Link className="hover:text-pen" href={`/jobs/${jobId}/sheets/${sheet.id}`}>
                    {sheet.title}
                  </Link>
                </b>
                <small className="i2">
                  {sheet.revisionId ? (
                    <Link className="t" href={`/jobs/${jobId}/revisions/${sheet.revisionId}`}>
                      revision {sheet.revision}
                    </Link>
                  ) : (
                    'not frozen yet'
                  )}
                </small>
              </span>
              <StatusMark mark={sheet.state} />
              <span className="crev">{sheet.revision ?? '–'}</span>
              <span>{sheet.originator}</span>
              <span className="cchk">
                {sheet.checkId ? (
                  <Link className="t" href={`/jobs/${jobId}/checks/${sheet.checkId}`}>
                    {sheet.checker ?? 'check'}
                  </Link>
                ) : (
                  (sheet.checker ?? '–')
                )}
              </span>
              <span className="cch i2 s">{sayMoment(sheet.changedAt, zone)}</span>
              <span>{mayMake ? <CopyForm sheet={sheet} jobId={jobId} /> : null}</span>
            </div>
          </LedgerRow>
        ))}
      </Ledger>
    </>
  );
}
