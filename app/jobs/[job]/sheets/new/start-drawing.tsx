import type { StartingSheet } from '@/lib/model/starting-draft';

const members: Record<StartingSheet, string> = {
  beam: 'M20 50H180',
  portal: 'M50 86V28H150V86',
  frame: 'M40 86V20H170M40 53H110M110 86V20',
};

const ground = 'm-11 0h22m-18 0-4 5m9-5-4 5m9-5-4 5m9-5-4 5';
const pin = 'l-7 12h14Z';

const supports: Record<StartingSheet, string[]> = {
  beam: [`M20 52${pin}`, `M20 64${ground}`, `M100 52${pin}`, 'M90 67H110', `M180 52${pin}`, 'M170 67H190'],
  portal: [`M50 86${ground}`, `M150 86${ground}`],
  frame: [`M40 86${ground}`, `M110 86${ground}`],
};

const says: Record<StartingSheet, string> = {
  beam: 'A straight beam over three supports',
  portal: 'Two columns and a beam',
  frame: 'Columns and beams at any joints',
};

/** A starting sheet as a small drawing. */
export function StartDrawing({ start }: { start: StartingSheet }) {
  return (
    <svg viewBox="0 0 200 104" role="img" aria-label={says[start]}>
      <g fill="none" stroke="var(--ink)">
        <path d={members[start]} strokeWidth="3" strokeLinecap="square" />
        {supports[start].map((d) => (
          <path key={d} d={d} strokeWidth="1.2" />
        ))}
      </g>
    </svg>
  );
}
