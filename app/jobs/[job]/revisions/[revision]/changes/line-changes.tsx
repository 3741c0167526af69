'use client';

import type { Block } from '@/templates/block';
import type { LinePair } from '@/templates/compare-blocks';
import { SheetView } from '@/templates/screen/sheet-view';

interface Props {
  lines: readonly LinePair[];
  before: number;
  after: number;
}

/** The lines that say something else, earlier on the left, later on the right. */
export function LineChanges({ lines, before, after }: Props) {
  const changed = lines.filter((l) => !l.same);
  const same = lines.length - changed.length;
  if (changed.length === 0) return <p className="i2">All {same} lines are as they were.</p>;
  return (
    <>
      <p className="i2">
        {changed.length === 1 ? 'One line differs' : `${changed.length} lines differ`}, {same} are as before.
      </p>
      <ol className="linepairs">
        {changed.map((l) => (
          <li key={`${l.before?.id ?? ''} ${l.after?.id ?? ''}`}>
            <Side title={`Revision ${before}`} block={l.before} absent="This line is new." />
            <Side title={`Revision ${after}`} block={l.after} absent="This line was taken out." />
          </li>
        ))}
      </ol>
    </>
  );
}

function Side({ title, block, absent }: { title: string; block: Block | undefined; absent: string }) {
  return (
    <section aria-label={title}>
      <h3>{title}</h3>
      {block ? <SheetView blocks={[block]} /> : <p className="i2">{absent}</p>}
    </section>
  );
}
