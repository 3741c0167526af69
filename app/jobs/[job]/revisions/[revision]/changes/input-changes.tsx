import { ReadingPage } from '@/app/components/reading-page';
import type { DraftChangeNote } from '@/lib/model/compare-drafts';

interface Props {
  inputs: readonly DraftChangeNote[];
  before: number;
  after: number;
}

/** Every field that was written differently. */
export function InputChanges({ inputs, before, after }: Props) {
  if (inputs.length === 0) return <p className="i2">Every input is as it was.</p>;
  return (
    <ReadingPage className="scrollx" label="Inputs that changed" focusable>
      <table className="rl changes">
        <thead>
          <tr>
            <th scope="col">Input</th>
            <th scope="col">Revision {before}</th>
            <th scope="col">Revision {after}</th>
          </tr>
        </thead>
        <tbody>
          {inputs.map((c) => (
            <tr key={c.place}>
              <th scope="row">{c.place}</th>
              <td>{c.before ? <del>{c.before}</del> : <span className="i2">blank</span>}</td>
              <td>{c.after ? <ins>{c.after}</ins> : <span className="i2">blank</span>}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </ReadingPage>
  );
}
