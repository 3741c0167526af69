import type { Analysis } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';

/** Numbers beyond this, or nearer to zero than its inverse, leave what floating point can carry through a solution. */
const largest = 1e40;

/** Diagrams of all cases, and of all combinations; beyond it an answer would keep a person waiting. */
const mostDiagrams = { cases: 50_000, combinations: 200_000 } as const;

/** Refuses what is too large to be answered while a person waits, and numbers too large or small to reckon with. */
export function validateSize(analysis: Analysis): Refusal | undefined {
  for (const name of ['cases', 'combinations'] as const) {
    const n = analysis[name].length * analysis.members.length;
    if (n > mostDiagrams[name])
      return {
        code: 'too-large',
        message: `${analysis[name].length} ${name} on ${analysis.members.length} members are more than is solved here at once. Divide the structure or its ${name}.`,
        place: { path: name },
      };
  }
  const path = extreme(analysis, []);
  return path
    ? {
        code: 'out-of-range',
        message: `The number at ${path.join('.')} is too large or too small to reckon with.`,
        place: { path: path.join('.') },
      }
    : undefined;
}

/** The path to the first number out of range. */
function extreme(value: unknown, path: readonly string[]): readonly string[] | undefined {
  if (typeof value === 'number') {
    const size = Math.abs(value);
    return size > largest || (size > 0 && size < 1 / largest) ? path : undefined;
  }
  if (typeof value !== 'object' || value === null) return undefined;
  for (const [key, inner] of Object.entries(value)) {
    if (typeof inner === 'string') continue;
    const found = extreme(inner, [...path, key]);
    if (found) return found;
  }
  return undefined;
}
