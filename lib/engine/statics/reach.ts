/** Nodes that can be reached from given ones, each before those it feeds: depth first, without recursion. */
export function reach(
  count: number,
  feeds: (node: number) => readonly number[],
): (start: readonly number[]) => number[] {
  const seen = new Int32Array(count);
  let turn = 0;
  return (start) => {
    turn++;
    const done: number[] = [];
    const path: number[] = [];
    const next: number[] = [];
    for (const first of start) {
      if (seen[first] === turn) continue;
      seen[first] = turn;
      path.push(first);
      next.push(0);
      while (path.length > 0) {
        const top = path.length - 1;
        const node = path[top] as number;
        const fed = feeds(node)[next[top] as number];
        next[top] = (next[top] as number) + 1;
        if (fed === undefined) {
          done.push(node);
          path.pop();
          next.pop();
        } else if (seen[fed] !== turn) {
          seen[fed] = turn;
          path.push(fed);
          next.push(0);
        }
      }
    }
    return done.reverse();
  };
}
