import { ReadingPage } from '@/app/components/reading-page';
import type { ValuePair } from '@/lib/services/result-values';

interface Props {
  values: readonly ValuePair[];
  before: number;
  after: number;
}

const figures = new Intl.NumberFormat('en-US', { minimumFractionDigits: 3, maximumFractionDigits: 3 });
const percent = new Intl.NumberFormat('en-US', {
  style: 'percent',
  minimumFractionDigits: 1,
  maximumFractionDigits: 1,
  signDisplay: 'exceptZero',
});
const write = (value: number | undefined) =>
  value === undefined ? '–' : figures.format(Math.abs(value) < 5e-4 ? 0 : value).replace('-', '−');

/** Results value by value. */
export function ValueChanges({ values, before, after }: Props) {
  const moved = values.filter((v) => write(v.before) !== write(v.after));
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
              <td className="r">{write(v.before)}</td>
              <td className="r">{write(v.after)}</td>
              <td className="r">
                {v.change === undefined ? '–' : percent.format(v.change).replace('-', '−')}
              </td>
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
