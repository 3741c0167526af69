import type { StartName } from '@/lib/model/starting-choice';

const members: Record<StartName, string> = {
  single: 'M30 50H170',
  beam: 'M20 50H180',
  portal: 'M50 86V28H150V86',
  gable: 'M40 86V46L100 22L160 46V86',
  knee: 'M50 86V30H160',
  storeys: 'M30 86V18H170V86M30 52H170M100 18V86',
  frame: 'M40 86V20H170M40 53H110M110 86V20',
};

const ground = 'm-11 0h22m-18 0-4 5m9-5-4 5m9-5-4 5m9-5-4 5';
const wall = 'M30 36V64m0-26-6-5m6 12-6-5m6 12-6-5m6 12-6-5';
const pin = 'l-7 12h14Z';

const supports: Record<StartName, string[]> = {
  single: [wall, `M170 52${pin}`, 'M160 67H180'],
  beam: [`M20 52${pin}`, `M20 64${ground}`, `M100 52${pin}`, 'M90 67H110', `M180 52${pin}`, 'M170 67H190'],
  portal: [`M50 86${ground}`, `M150 86${ground}`],
  gable: [`M40 86${ground}`, `M160 86${ground}`],
  knee: [`M50 86${ground}`, `M160 32${pin}`, 'M150 47H170'],
  storeys: [`M30 86${ground}`, `M100 86${ground}`, `M170 86${ground}`],
  frame: [`M40 86${ground}`, `M110 86${ground}`],
};

const says: Record<StartName, string> = {
  single: 'A span fixed at one end and propped at the other',
  beam: 'A straight beam over three supports',
  portal: 'Two columns and a beam',
  gable: 'Two columns and two rafters',
  knee: 'A column and a beam',
  storeys: 'Two bays and two storeys',
  frame: 'Columns and beams at any joints',
};

/** A starting sheet as a small drawing. */
export function StartDrawing({ start }: { start: StartName }) {
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
