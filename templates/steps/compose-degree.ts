import type { DegreeStep } from '@/lib/engine/derivation/degree-step';
import { powerTex } from '@/lib/typeset/number';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { countWords, listWords, memberWords, plain } from './words';
import { relationRow } from './write-lines';

/** Step 3: the count, the short count, and the rank. */
export function composeDegree(step: DegreeStep, out: StepWriter, scene: Scene): void {
  const { determinacy: d, rings } = step;
  const { units, names, placed } = scene;
  out.heading('Degree of indeterminacy');
  const released = d.releases > 0 ? `, less $n=${d.releases}$ released` : '';
  out.equations(
    `**By count.** Unknown are $N$ and the two end moments of each of $m=${d.members}$ members and $c=${d.reactions}$ reaction components${released}. Each of $j=${d.joints}$ joints gives three equations.`,
    [relationRow(step.count, units)],
  );
  const what = names.beam ? 'beam' : 'frame';
  const closed =
    rings > 0 ? `, and three for each of ${countWords(rings)} closed ring${rings > 1 ? 's' : ''}` : '';
  const hinges = d.releases > 0 ? `, less ${countWords(d.releases)} released` : '';
  out.paragraph(
    `The short count agrees: ${d.reactions} reaction components less 3 equations of the whole ${what}${closed}${hinges}.`,
  );
  const left = d.degree === 1 ? 'force is' : 'forces are';
  const trivial = d.equations < 3 * d.joints ? ' that say something' : '';
  out.paragraph(
    `**By rank.** The ${d.equations} joint equations${trivial} in the ${d.unknowns} unknowns have rank ${d.rank}: no equation is lost, so the ${what} is stable, and $${d.unknowns}-${d.rank}=${d.degree}$ ${left} left free. With columns scaled to one, the smallest pivot is $${powerTex(d.smallestPivot)}$ against a tolerance of $${powerTex(d.tolerance)}$.`,
  );
  if (d.openAxial.length > 0) {
    const who = d.openAxial.map((id) => {
      const p = placed.get(id);
      return p ? memberWords(p) : plain(id);
    });
    out.paragraph(
      `$N$ of ${listWords(who)} is not determined by bending: no load acts along it and it is taken as zero. With a load, a temperature or a misfit along it $EA$ is needed. ${d.bendingDegree === 1 ? 'One force is' : `${d.bendingDegree} forces are`} left to bending.`,
    );
  }
}
