/**
 * A symbol as data: letter, place below, case above. A bar marks a unit state, a hat the height of a part. Subscript
 * parts are names (of joints, members, redundants) or the marks ',', '–', '0', 'x', 'y', 'φ'.
 */
export interface SymbolName {
  letter: string;
  sub?: readonly string[];
  super?: string;
  mark?: 'bar' | 'hat';
  /** EI0 stands in front: EI0 δ. */
  timesEI0?: boolean;
}

/** One string per symbol, equal exactly when the symbols are. */
export function symbolKey(s: SymbolName): string {
  return [s.timesEI0 ? 'EI0' : '', s.mark ?? '', s.letter, (s.sub ?? []).join('\u0001'), s.super ?? ''].join(
    '\u0002',
  );
}

/** The symbol with another case above it. */
export const inCase = (s: SymbolName, id: string): SymbolName => ({ ...s, super: id });

/** The symbol of the same quantity on the primary structure (subscript 0). */
export const onPrimary = (s: SymbolName): SymbolName => withSub(s, '0');

/** The symbol of the same quantity in unit state i (counted from 0). */
export const inUnitState = (s: SymbolName, i: number): SymbolName => ({
  ...withSub(s, `${i + 1}`),
  mark: 'bar',
});

function withSub(s: SymbolName, part: string): SymbolName {
  const sub = s.sub ?? [];
  return { ...s, sub: sub.length === 0 ? [part] : [...sub, ',', part] };
}
