import { derive } from '@/lib/engine/derivation/derive';
import { placeMembers } from '@/lib/engine/derivation/geometry';
import { nameQuantities } from '@/lib/engine/derivation/names';
import type { SymbolName } from '@/lib/engine/derivation/symbol-name';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import type { Solution } from '@/lib/engine/solution';
import { symbolTex } from '@/lib/typeset/write-symbol';
import { parseTex } from './parse-tex';
import type { Worked } from './work-out';

/** N, V and M at the ends of members and the reactions, in every case and combination, from the engine itself. */
function endValues(solution: Solution): [string, Worked][] {
  const names = nameQuantities(solution.analysis, placeMembers(solution.analysis));
  const states = [
    ...Object.entries(solution.cases).map(([id, c]) => ({ id, members: c.members, reactions: c.reactions })),
    ...solution.combinations,
  ];
  const key = (s: SymbolName, id: string) => {
    const node = parseTex(symbolTex({ ...s, super: id }));
    return node.kind === 'symbol' ? node.name : '';
  };
  return states.flatMap(({ id, members, reactions }): [string, Worked][] => [
    ...reactions.map((r): [string, Worked] => [
      key(names.quantity(r.quantity), id),
      { value: r.value, unit: undefined },
    ]),
    ...Object.entries(members).flatMap(([m, d]) =>
      (['start', 'end'] as const).flatMap((end): [string, Worked][] => {
        const at = (f: typeof d.M) =>
          end === 'start' ? valueAt(f, 0) : valueAt(f, f.at(-1)?.to ?? 0, 'left');
        return [
          [key(names.moment(m, end), id), { value: at(d.M), unit: undefined }],
          [key(names.shear(m, end), id), { value: at(d.V), unit: undefined }],
          [key(names.axial(m, end), id), { value: at(d.N), unit: undefined }],
        ];
      }),
    ),
  ]);
}

/** Full-precision values behind the symbols of a sheet, and the symbols that stand for more than one value. */
export function fullValues(solution: Solution): { values: Map<string, Worked>; twice: string[] } {
  const values = new Map<string, Worked>();
  const twice = new Set<string>();
  const visit = (x: unknown): void => {
    if (Array.isArray(x)) {
      for (const y of x) visit(y);
      return;
    }
    if (x === null || typeof x !== 'object') return;
    const v = x as {
      kind?: unknown;
      symbol?: SymbolName;
      value?: unknown;
      dimension?: { force: number; length: number; temperature: number };
    };
    if (
      v.kind === 'value' &&
      v.symbol &&
      v.symbol.letter !== 'Σ' &&
      typeof v.value === 'number' &&
      v.dimension
    ) {
      const node = parseTex(symbolTex(v.symbol));
      const name = node.kind === 'symbol' ? node.name : symbolTex(v.symbol);
      const { force, length, temperature } = v.dimension;
      const known = values.get(name);
      const worked: Worked = { value: v.value, unit: [force, length, temperature] };
      if (!known) values.set(name, worked);
      else if (Math.abs(known.value - worked.value) > 1e-9 * Math.max(Math.abs(known.value), 1e-3))
        twice.add(name);
    }
    for (const y of Object.values(x)) visit(y);
  };
  visit(derive(solution));
  for (const [name, worked] of endValues(solution)) if (!values.has(name)) values.set(name, worked);
  return { values, twice: [...twice] };
}
