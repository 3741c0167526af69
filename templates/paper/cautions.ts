import type { Block } from '../block';
import type { PaperMode } from './imprint';

/** In one paragraph on the cover, in full on the package's last page. */
export const CAUTIONS_SHORT =
  'First-order, linear elastic, small-displacement plane analysis. Second-order effects, buckling, torsion, dynamics, connections and construction stages are not covered unless a sheet says so. Local codes govern. A second run of the same engine is not an independent check.';

const STANDING: Readonly<Record<PaperMode, string>> = {
  preliminary:
    'This copy is preliminary. It is not for construction, bears no seal, and its figures may change before they are checked.',
  review:
    'This is a review copy. It is unsigned; the sealed file is the record, and its digest stands in the foot line of each page.',
  final:
    'The sealed file is the record. A print shows the seal but cannot prove it: the signature is verified in the file.',
};

/** The package's last page, after what the office itself adds. */
export function cautionBlocks(mode: PaperMode, verifyAt?: string): Block[] {
  return [
    { kind: 'heading', id: 'A', text: 'What these calculations cover' },
    {
      kind: 'caution',
      id: 'A.1',
      text: '**First-order, linear elastic, small-displacement plane analysis.**',
    },
    {
      kind: 'paragraph',
      id: 'A.2',
      text: 'Not covered unless a sheet says so: second-order effects, buckling, lateral-torsional buckling, torsion, out-of-plane action, dynamics, cracking, creep, connections, construction stages.',
    },
    {
      kind: 'paragraph',
      id: 'A.3',
      text: 'Local codes govern. A licensed engineer is responsible for the inputs, for whether the method applies, and for the use made of the results.',
    },
    {
      kind: 'paragraph',
      id: 'A.4',
      text: 'The second way of solving that the sheets print shares nothing with the first but the model. It finds slips of calculation, not of assumption: a second run of the same engine is not an independent check.',
    },
    { kind: 'heading', id: 'B', text: 'This copy' },
    { kind: 'paragraph', id: 'B.1', text: STANDING[mode] },
    ...(verifyAt ? [verification(verifyAt)] : []),
  ];
}

function verification(verifyAt: string): Block {
  const text = `The inputs and results of every sheet ride inside the file. Anybody can verify it at ${verifyAt}: who sealed it and when, whether it was changed since, and whether its inputs, solved again, give its results.`;
  return { kind: 'paragraph', id: 'B.2', text };
}
