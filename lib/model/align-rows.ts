/** A pair of rows that belong together; one side is missing where a row was added or removed. */
export interface RowPair {
  before?: number;
  after?: number;
}

/**
 * Pairs the rows of two lists: equal rows by a longest common subsequence, and between those, rows that `alike` holds
 * to be the same thing changed, in order. Whatever is left was removed or added.
 */
export function alignRows<T>(
  before: readonly T[],
  after: readonly T[],
  equal: (a: T, b: T) => boolean,
  alike: (a: T, b: T) => boolean = () => true,
): RowPair[] {
  const anchors = [...equalPairs(before, after, equal), [before.length, after.length] as const];
  const pairs: RowPair[] = [];
  let [i, j] = [0, 0];
  for (const [nextI, nextJ] of anchors) {
    pairs.push(...pairBetween(before, after, [i, nextI], [j, nextJ], alike));
    if (nextI < before.length || nextJ < after.length) pairs.push({ before: nextI, after: nextJ });
    [i, j] = [nextI + 1, nextJ + 1];
  }
  return pairs;
}

/** Places of equal rows, rising in both lists; the common head and tail are found first, being most of any edit. */
function equalPairs<T>(a: readonly T[], b: readonly T[], equal: (x: T, y: T) => boolean): [number, number][] {
  const same = (i: number, j: number) => equal(a[i] as T, b[j] as T);
  let head = 0;
  while (head < a.length && head < b.length && same(head, head)) head++;
  let tail = 0;
  while (tail < a.length - head && tail < b.length - head && same(a.length - 1 - tail, b.length - 1 - tail))
    tail++;
  const [n, m] = [a.length - head - tail, b.length - head - tail];
  const longest = Array.from({ length: n + 1 }, () => new Uint32Array(m + 1));
  const at = (i: number, j: number) => longest[i]?.[j] as number;
  for (let i = n - 1; i >= 0; i--)
    for (let j = m - 1; j >= 0; j--)
      (longest[i] as Uint32Array)[j] = same(head + i, head + j)
        ? at(i + 1, j + 1) + 1
        : Math.max(at(i + 1, j), at(i, j + 1));
  const middle: [number, number][] = [];
  for (let i = 0, j = 0; i < n && j < m; ) {
    if (same(head + i, head + j)) middle.push([head + i++, head + j++]);
    else if (at(i + 1, j) >= at(i, j + 1)) i++;
    else j++;
  }
  const ends = Array.from({ length: tail }, (_, k): [number, number] => [
    a.length - tail + k,
    b.length - tail + k,
  ]);
  return [...Array.from({ length: head }, (_, k): [number, number] => [k, k]), ...middle, ...ends];
}

function pairBetween<T>(
  before: readonly T[],
  after: readonly T[],
  [i0, i1]: readonly [number, number],
  [j0, j1]: readonly [number, number],
  alike: (a: T, b: T) => boolean,
): RowPair[] {
  const pairs: RowPair[] = [];
  let j = j0;
  for (let i = i0; i < i1; i++) {
    let match = j;
    while (match < j1 && !alike(before[i] as T, after[match] as T)) match++;
    if (match === j1) {
      pairs.push({ before: i });
      continue;
    }
    for (; j < match; j++) pairs.push({ after: j });
    pairs.push({ before: i, after: j++ });
  }
  for (; j < j1; j++) pairs.push({ after: j });
  return pairs;
}
