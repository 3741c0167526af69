import { ReadingPage } from '@/app/components/reading-page';
import type { ValuePair } from '@/lib/services/result-values';
import { writeDifference, writeValue } from '@/templates/write-pair';

interface Props {
  values: readonly ValuePair[];
  before: number;
  after: number;
}

/** Results value by value. */
export function ValueChanges({ values, before, after }: Props) {
  const moved = values.filter((v) => writeValue(v.before) !== writeValue(v.after));
  if (moved.length === 0)
    return <p className="i2">All {values.length} reactions and greatest moments are as they were.</p>;
  const same = values.length - moved.length;
  return (
    <ReadingPage className="scrollx" label="Results that changed" focusable>
      <table className="rl changes">
        <thead>
          <tr>
            <th scope="col">Value</th>
            <th scope="col">Unit</th>
            <th scope="col" className="r">
              Revision {before}
            </th>
            <th scope="col" className="r">
              Revision {after}
            </th>
            <th scope="col" className="r">
              Change
            </th>
          </tr>
        </thead>
        <tbody>
          {moved.map((v) => (
            <tr key={`${v.name} ${v.unit}`}>
              <th scope="row">{v.name}</th>
              <td>{v.unit}</td>
              <td className="r">{writeValue(v.before)}</td>
              <td className="r">{writeValue(v.after)}</td>
              <td className="r">{writeDifference(v.change)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {same > 0 ? (
        <p className="i2">{same === 1 ? 'One value is' : `${same} values are`} as before.</p>
      ) : null}
    </ReadingPage>
  );
}
