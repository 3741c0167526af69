import { ReadingPage } from '@/app/components/reading-page';
import type { SheetProof } from '@/lib/services/verification/solve-again';
import type { Verified } from '@/lib/services/verification/verify-file';
import { Hung } from '../components/ledger';

/** What the package carries inside it, solved again. */
export function ContentsReport({ contents }: { contents: Verified['contents'] }) {
  if (!contents.ours)
    return (
      <Hung at="section">
        <h2>Contents</h2>
        <p className="i2">{contents.why} There is nothing to solve again.</p>
      </Hung>
    );
  return (
    <Hung at="section">
      <h2>Contents, solved again now</h2>
      <p className="i2">
        {contents.job.number} {contents.job.title}, submittal {contents.submittal}
      </p>
      <ReadingPage className="scrollx" label="Sheets solved again" focusable>
        <table className="rl">
          <thead>
            <tr>
              <th scope="col">Sheet</th>
              <th scope="col">Rev</th>
              <th scope="col">Stored results</th>
              <th scope="col">Digest</th>
            </tr>
          </thead>
          <tbody>
            {contents.sheets.map((s) => (
              <tr key={s.sheet}>
                <th scope="row">
                  {s.sheet} {s.title}
                </th>
                <td>{s.revision}</td>
                <td>{saySolved(s)}</td>
                <td>{sayDigest(s)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </ReadingPage>
    </Hung>
  );
}

function saySolved(s: SheetProof): string {
  if (!s.solved) return `Not solved again. ${s.why}`;
  const by = s.by === s.engine ? '' : ` Engine ${s.engine} then, ${s.by} now.`;
  if (s.differing.length === 0) return `All ${s.compared} come out again.${by}`;
  const first = s.differing.slice(0, 3).join(', ');
  return `${s.differing.length} of ${s.compared} do not come out again: ${first}${s.differing.length > 3 ? ' …' : ''}.${by}`;
}

function sayDigest(s: SheetProof): string {
  if (!s.solved) return '–';
  if (s.digestHolds) return `${s.digest.slice(0, 8)} comes out again`;
  return s.by === s.engine
    ? `${s.digest.slice(0, 8)} does not come out again`
    : `${s.digest.slice(0, 8)} belongs to engine ${s.engine}`;
}
