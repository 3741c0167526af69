import { combine } from '@/lib/engine/combinations/combine';
import { joinCombinations } from '@/lib/engine/combinations/join-combinations';
import { findSet } from '@/lib/engine/combinations/published-sets';
import { spreadLive } from '@/lib/engine/combinations/spread-live';
import type { Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import { analysis as analysisSchema } from '@/lib/model/analysis';
import type { Draft } from '@/lib/model/draft';
import type { FieldError } from '@/lib/model/field-reader';
import { readDraft } from '@/lib/model/read-draft';
import type { Refusal } from '@/lib/model/refusal';
import type { Block } from '@/templates/block';
import { compose } from '@/templates/compose';

export type SolvedDraft =
  | { ok: true; solution: Solution; blocks: Block[] }
  | { ok: false; errors: FieldError[]; refusal?: Refusal };

/** Reads a draft, loads its spans in turn if asked, adds the combinations of its published set, solves it and writes it out. */
export function solveDraft(draft: Draft): SolvedDraft {
  const read = readDraft(draft);
  if (!read.ok) return { ok: false, errors: read.errors };
  const whole = analysisSchema.parse(read.analysis);
  const spread = draft.patterns
    ? spreadLive(whole)
    : { ok: true as const, analysis: whole, arrangements: [] };
  if (!spread.ok) return { ok: false, errors: [{ path: 'patterns', message: spread.message }] };
  const { analysis, arrangements } = spread;
  const set = draft.combinationSet === '' ? undefined : findSet(draft.combinationSet);
  const published = set ? combine(analysis.cases, set, arrangements) : [];
  const combinations = joinCombinations(published, analysis.combinations);
  const solved = solve({ ...analysis, combinations }, { otherRedundants: true });
  if (!solved.ok) return { ok: false, errors: [], refusal: solved.refusal };
  return {
    ok: true,
    solution: solved.value,
    blocks: compose(solved.value, { title: draft.title, basis: draft.basis }),
  };
}
