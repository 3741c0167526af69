import { describe, expect, it } from 'vitest';
import { derive } from '@/lib/engine/derivation/derive';
import type { Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { compose } from '@/templates/compose';
import { beam, frame } from '../bench/structures';

function solved(input: AnalysisInput): Solution {
  const result = solve(input);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

const written = (input: AnalysisInput) => compose(solved(input), { figures: false });
const size = (input: AnalysisInput) => JSON.stringify(written(input)).length;
const texts = (input: AnalysisInput) => written(input).flatMap((b) => ('text' in b ? [b.text ?? ''] : []));

describe('a large structure', () => {
  it('of many cells is written to the end, and says which steps stand by their results alone and why', () => {
    const said = texts(frame(8, 8)).filter((t) => t.startsWith('**Not written out.**'));
    // Primary structure, parts, unit states, virtual work, compatibility.
    expect(said).toHaveLength(5);
    expect(new Set(said).size).toBe(1);
    expect(said[0]).toContain('192 redundants (more than 150)');
  });

  it('never says of a frame with redundants that it has none', () => {
    const all = texts(frame(8, 8)).join(' ');
    for (const wrong of ['no redundant', 'nothing to solve', 'No load bends', 'act on nothing in common'])
      expect(all).not.toContain(wrong);
  });

  it('of many spans keeps its tables of coefficients, gaps and redundants', () => {
    const blocks = written(beam(100));
    const rows = (caption: string) =>
      blocks.flatMap((b) => (b.kind === 'table' && b.caption?.includes(caption) ? b.rows : [])).length;
    expect(rows('Flexibility coefficients')).toBe(99 + 98);
    expect(rows('Gaps under case D')).toBe(99);
    // Named in step 4, solved in step 10.
    expect(rows('Redundants.')).toBe(2 * 99);
    expect(rows('stretches under uniform load')).toBe(100);
    expect(texts(beam(100)).some((t) => t.startsWith('**Not written line by line.**'))).toBe(true);
  });

  it('grows on paper with its members, not with their square', () => {
    expect(size(beam(100)) / size(beam(50))).toBeLessThan(2.2);
    expect(size(frame(16, 8)) / size(frame(8, 8))).toBeLessThan(2.2);
  });

  it('prints every redundant, reaction and check of a frame on states around its cells', () => {
    const solution = solved(frame(8, 8));
    const steps = derive(solution);
    const of = <K extends (typeof steps)[number]['kind']>(kind: K) =>
      steps.find((s): s is Extract<(typeof steps)[number], { kind: K }> => s.kind === kind);
    expect(of('solution')?.values[0]?.X.map((x) => x.value)).toEqual(solution.X.D);
    expect(of('forces')?.cases[0]?.reactions).toHaveLength(27);
    expect(of('checks')?.checks).toEqual(solution.checks);
    expect(of('compatibility')?.notWritten).toEqual({ why: 'cells', redundants: 192, upTo: 150 });
  });
});
