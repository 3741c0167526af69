import type { CautionsStep } from '@/lib/engine/derivation/cautions-step';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, memberWords, plain } from './words';

/** Step 17: what is not covered, and who answers for what. */
export function composeCautions(step: CautionsStep, out: StepWriter, { placed }: Scene): void {
  const name = (id: string) => {
    const p = placed.get(id);
    return p ? memberWords(p) : plain(id);
  };
  out.heading('Cautions');
  out.caution(
    'First-order, linear elastic, small-displacement plane analysis. Not covered unless a sheet says so: second-order effects, buckling, lateral-torsional buckling, torsion, out-of-plane action, dynamics, cracking, creep, connections, construction stages. Local codes govern. A licensed engineer is responsible for the inputs, for the applicability of the method and for the use of the results. A second run of the same program is not an independent check; the lines of step 15 can be worked by hand.',
  );
  const members = [...new Set(step.hogging.map((h) => h.member))];
  if (members.length > 0) {
    const said = members.map(
      (m) => `${name(m)} (${listWords(step.hogging.filter((h) => h.member === m).map((h) => plain(h.by)))})`,
    );
    out.caution(
      `Spans in hogging over their whole length: ${listWords(said)}. There the lower flange is in compression from support to support and is to be held there too.`,
    );
  }
  if (step.openAxial.length > 0) {
    out.caution(
      `The axial force of ${listWords(step.openAxial.map(name))} is taken as zero because bending does not determine it; a change of length there needs $EA$.`,
    );
  }
}
