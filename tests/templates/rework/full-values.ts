import { derive } from '@/lib/engine/derivation/derive';
import type { SymbolName } from '@/lib/engine/derivation/symbol-name';
import type { Solution } from '@/lib/engine/solution';
import { symbolTex } from '@/lib/typeset/write-symbol';
import { parseTex } from './parse-tex';
import type { Worked } from './work-out';

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
  return { values, twice: [...twice] };
}
