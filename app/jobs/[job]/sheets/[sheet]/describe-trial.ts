// server only
import { choose } from '@/lib/engine/force-method/choose';
import { drawMechanism } from '@/lib/figures/draw-mechanism';
import { analysis as analysisSchema } from '@/lib/model/analysis';
import type { Draft } from '@/lib/model/draft';
import type { Quantity } from '@/lib/model/quantity';
import { readDraft } from '@/lib/model/read-draft';
import { measureLabel } from '@/templates/screen/lay-out-label';
import type { Trial } from './_desk/writing';

/** Whether a set of redundants leaves a stable primary structure; if not, why, and how it would move. */
export function describeTrial(draft: Draft, quantities: Quantity[]): Trial {
  const read = readDraft(draft);
  if (!read.ok) return { good: false, message: 'The sheet is not complete yet.', drawing: undefined };
  const analysis = analysisSchema.parse(read.analysis);
  const choice = choose(analysis, quantities);
  if (choice.good) return { good: true, condition: choice.condition, drawing: undefined };
  const options = { width: 418, measure: measureLabel };
  const drawing = choice.mechanism
    ? drawMechanism(analysis, quantities, choice.mechanism, options)
    : undefined;
  return { good: false, message: choice.message, drawing };
}
