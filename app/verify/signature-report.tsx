import type { Verified } from '@/lib/services/verification/verify-file';
import { Hung } from '../components/ledger';

/** Dates arrive as text, since they came through JSON. */
function say(at: Date | string, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short', timeZone: zone }).format(
    new Date(at),
  );
}

/** Who signed, when, and what speaks against the file. */
export function SignatureReport({ verified, zone }: { verified: Verified; zone: string }) {
  const { report, noTrust } = verified;
  return (
    <Hung at="section">
      <h2>Seal</h2>
      <dl className="report">
        {report.signers.map((s) => (
          <div key={s.field}>
            <dt>Sealed by</dt>
            <dd>
              <b>{s.holder.name}</b>
              {s.holder.licenceNumber ? `, licence ${s.holder.licenceNumber}` : ''}
              {s.holder.organization ? `, ${s.holder.organization}` : ''}
              <br />
              <span className="i2">
                {s.stamp
                  ? `${say(s.stamp.time, zone)}, by the time stamp of ${s.stamp.authority}`
                  : 'no time stamp: when it was sealed is not proved'}
                <br />
                certificate of {s.issuer}
              </span>
            </dd>
          </div>
        ))}
        {report.reasons.map((r) => (
          <div key={`${r.code} ${r.field ?? ''}`}>
            <dt>Against it</dt>
            <dd>{r.sentence}</dd>
          </div>
        ))}
        {report.changes.map((c) => (
          <div key={`${c.kind} ${c.page ?? ''} ${c.revision}`}>
            <dt>{c.page ? `Page ${c.page}` : 'Changed since'}</dt>
            <dd>{c.sentence}</dd>
          </div>
        ))}
        <div>
          <dt>SHA-256</dt>
          <dd className="digest">{report.sha256}</dd>
        </div>
      </dl>
      {noTrust ? (
        <p className="message e">
          No authority is trusted on this server, so no signature can be found good here.
        </p>
      ) : null}
    </Hung>
  );
}
