import { dimensions, per } from '@/lib/engine/derivation/dimensions';
import type { EndForces } from '@/lib/engine/derivation/end-forces';
import { unitHead } from '@/lib/typeset/write-unit';
import type { Dimension } from '@/lib/units/dimension';
import type { Scene } from './scene';
import type { TableInput } from './step-writer';
import { memberWords, plain } from './words';
import { cell } from './write-lines';

interface EndTableOptions {
  caption: string;
  /** What follows the letters N, V, M in the head: "_0". */
  mark?: string;
  /** Of a unit state: the letters are barred and the values are per unit of this. */
  perUnit?: Dimension;
  note?: string;
}

/** N, V, M at both ends of every member of one state. */
export function endTable(ends: readonly EndForces[], scene: Scene, options: EndTableOptions): TableInput {
  const { placed, units, plan } = scene;
  const { caption, mark = '', perUnit, note } = options;
  const head = (letter: string) => (perUnit ? `$\\bar{${letter}}${mark}$` : `$${letter}${mark}$`);
  const unitOf = (d: Dimension) => unitHead(perUnit ? per(d, perUnit) : d, units);
  const [force, moment] = perUnit ? [plan.unitForce, plan.unitMoment] : [plan.force, plan.moment];
  return {
    caption,
    note,
    columns: [
      { head: 'member', align: 'left' },
      { head: 'at', align: 'left' },
      { head: head('N'), unit: unitOf(dimensions.force), align: 'right' },
      { head: head('V'), unit: unitOf(dimensions.force), align: 'right' },
      { head: head(perUnit ? 'm' : 'M'), unit: unitOf(dimensions.moment), align: 'right' },
    ],
    rows: ends.map((e) => {
      const p = placed.get(e.member);
      return {
        cells: [
          p ? memberWords(p) : plain(e.member),
          plain(e.joint),
          cell(e.N, force, units),
          cell(e.V, force, units),
          cell(e.M, moment, units),
        ],
      };
    }),
  };
}
