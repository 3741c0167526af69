'use client';

import type { Writing } from '../writing';

/** The checks behind every solution, with what was left over and what was allowed. */
export function ChecksStep({ writing }: { writing: Writing | undefined }) {
  if (writing?.state !== 'written') {
    return (
      <p className="ans">
        Checks stand here when the sheet is solved. A solution that fails one is not shown.
      </p>
    );
  }
  return (
    <>
      <table className="rl" aria-label="Checks">
        <thead>
          <tr>
            <th scope="col">Check</th>
            <th scope="col" className="r">
              left over
            </th>
            <th scope="col" className="r">
              allowed
            </th>
            <th scope="col" />
          </tr>
        </thead>
        <tbody>
          {writing.checks.map((c) => (
            <tr key={c.subject}>
              <td>{c.subject}</td>
              <td className="r num">{c.residual}</td>
              <td className="r num">{c.tolerance}</td>
              <td>{c.holds ? 'holds' : 'fails'}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="ans">
        A second run of the same engine is not an independent check. A checker other than the originator goes
        through the sheet after it is frozen.
      </p>
    </>
  );
}
