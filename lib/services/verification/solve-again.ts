// server only
import { draft as draftSchema } from '@/lib/model/draft';
import { revisionDigest } from '../revision-digest';
import { solveDraft } from '../solve-draft';
import { storedResults } from '../stored-results';
import { compareResults, type ResultComparison } from './compare-results';
import type { EmbeddedSheet } from './embedded-package';

export type SheetProof = Pick<EmbeddedSheet, 'sheet' | 'title' | 'revision' | 'digest' | 'engine'> &
  (
    | ({
        solved: true /** Engine that solved it now. */;
        by: string /** Inputs, results and lines give the digest again. */;
        digestHolds: boolean;
      } & ResultComparison)
    | { solved: false; why: string }
  );

/** Solves the inputs of one sheet of a package again and holds every stored result against what comes out. */
export function solveAgain(sheet: EmbeddedSheet): SheetProof {
  const { title, revision, digest, engine } = sheet;
  const facts = { sheet: sheet.sheet, title, revision, digest, engine };
  const inputs = draftSchema.safeParse(sheet.inputs);
  if (!inputs.success)
    return { ...facts, solved: false, why: 'Its inputs are not of a form that is known here.' };
  const solved = solveDraft(inputs.data);
  if (!solved.ok)
    return { ...facts, solved: false, why: solved.refusal?.message ?? 'Its inputs are not complete.' };
  const results: unknown = JSON.parse(JSON.stringify(storedResults(solved.solution)));
  const again = revisionDigest({
    inputs: sheet.inputs,
    results: sheet.results,
    blocks: JSON.parse(JSON.stringify(solved.blocks)),
    engine,
  });
  return {
    ...facts,
    solved: true,
    by: solved.solution.engine,
    digestHolds: again === digest,
    ...compareResults(sheet.results, results),
  };
}
