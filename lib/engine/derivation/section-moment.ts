import type { Joint } from '@/lib/model/structure';
import { type Context, placedMember } from './context';
import { type Expression, evaluate, negative, sum } from './expression';
import { loadTerms, reactionTerms, type Side } from './side-terms';
import { signedTerm } from './statics-terms';

/**
 * The primary bending moment at an end of a member as the moment of all forces on one side of the cut, where cutting
 * the member there parts the structure. Undefined where it does not, or where the sum does not give the moment (a hinge
 * within the side passes no moment on).
 */
export function sectionMoment(
  ctx: Context,
  id: string,
  member: string,
  end: 'start' | 'end',
  moment: number,
): Expression | undefined {
  const p = placedMember(ctx, member);
  const centre = end === 'start' ? p.start : p.end;
  const sides = [sideOf(ctx, member, p.start.id), sideOf(ctx, member, p.end.id)] as const;
  if (sides[0].joints.has(p.end.id)) return undefined;
  const written = ([0, 1] as const).flatMap((which) => {
    const side = sides[which];
    const loaded = which === 0 ? end === 'end' : end === 'start';
    const members = loaded ? new Set([...side.members, member]) : side.members;
    const terms = momentTerms(ctx, id, { joints: side.joints, members }, centre);
    // Forces before the section turn against the walk: M = −Σ; those after it, M = +Σ.
    const pieces = terms.map((t) => (t.negative === (which === 0) ? t.expression : negative(t.expression)));
    if (pieces.length === 0) return [];
    const formula = sum(...pieces);
    return Math.abs(evaluate(formula) - moment) <= 1e-9 * Math.max(1, Math.abs(moment))
      ? [{ formula, size: pieces.length }]
      : [];
  });
  return written.sort((a, b) => a.size - b.size)[0]?.formula;
}

/** What hangs together with a joint when one member is taken out. */
function sideOf(ctx: Context, without: string, joint: string): Side {
  const joints = new Set([joint]);
  const members = new Set<string>();
  for (const at of joints) {
    for (const m of ctx.analysis.members) {
      if (m.id === without || members.has(m.id) || (m.start !== at && m.end !== at)) continue;
      members.add(m.id);
      joints.add(m.start === at ? m.end : m.start);
    }
  }
  return { joints, members };
}

function momentTerms(ctx: Context, id: string, side: Side, centre: Joint) {
  const about = { kind: 'moment', x: centre.x, y: centre.y, joint: centre.id } as const;
  const acting = { kind: 'case', id } as const;
  const reactions = ctx.solution.primary.loaded[id]?.reactions ?? [];
  return [...reactionTerms(ctx, reactions, side, about, true), ...loadTerms(ctx, id, side, about)]
    .filter((t) => Math.abs(t.coefficient) > 1e-9 && t.value !== 0)
    .map((t) => signedTerm(ctx, about, t, acting));
}
