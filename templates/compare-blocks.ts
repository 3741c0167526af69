import { alignRows } from '@/lib/model/align-rows';
import type { Block } from './block';

/** Two states of one line; one side is missing where the line was added or taken out. */
export interface LinePair {
  before?: Block;
  after?: Block;
  /** The same in all but its number. */
  same: boolean;
}

/**
 * Pairs the lines of two states of a sheet by what they say, not by their numbers: a line that only moved down is the
 * same line. Lines of one kind that stand in the same place between two that agree are one line changed.
 */
export function compareBlocks(before: readonly Block[], after: readonly Block[]): LinePair[] {
  const [was, is] = [before.map(said), after.map(said)];
  const places = (said: string[]) => said.map((_, i) => i);
  const sameAt = (i: number, j: number) => was[i] === is[j];
  const alikeAt = (i: number, j: number) => before[i]?.kind === after[j]?.kind;
  const pairs = alignRows(places(was), places(is), sameAt, alikeAt);
  return pairs.map((pair) => ({
    ...(pair.before === undefined ? {} : { before: before[pair.before] }),
    ...(pair.after === undefined ? {} : { after: after[pair.after] }),
    same: pair.before !== undefined && pair.after !== undefined && sameAt(pair.before, pair.after),
  }));
}

/** What a line says, without its number and the layout for a phone. Step, figure and table numbers inside it count. */
function said(block: Block): string {
  const { id: _id, ...rest } = block;
  if (rest.kind === 'figure') return JSON.stringify({ ...rest, narrow: undefined });
  return JSON.stringify(rest);
}
