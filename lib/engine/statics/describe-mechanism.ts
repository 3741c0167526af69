import type { Mechanism } from '@/lib/model/refusal';
import type { Equilibrium } from './equilibrium';

/** Code and sentence for a motion, in the trade's words: what moves, how, and what does not stop it. */
export function describeMechanism(eq: Equilibrium, m: Mechanism): { code: string; message: string } {
  const whole = m.pieces.length === 1 && m.pieces[0]?.members.length === eq.bars.length;
  const [piece] = m.pieces;
  if (!piece) return { code: 'joint-turns', message: 'A joint can turn without any force.' };
  if (whole && piece.slide) {
    return {
      code: 'parallel',
      message: `The reactions that remain are parallel: nothing stops sliding ${wayOf(piece.slide)}.`,
    };
  }
  if (whole && piece.centre) {
    const place = placeOf(piece.centre);
    return {
      code: 'concurrent',
      message: `The reactions that remain all pass through ${place}: nothing stops rotation about ${place}.`,
    };
  }
  const parts = m.pieces.slice(0, 3).map((p) => {
    const name =
      p.members.length === 1 ? `member ${p.members[0]}` : `the piece ${p.members.slice(0, 4).join(', ')}`;
    return p.centre
      ? `${name} turns about ${placeOf(p.centre)}`
      : `${name} slides ${wayOf(p.slide ?? { x: 0, y: 0 })}`;
  });
  const more = m.pieces.length > 3 ? ', and others move with them' : '';
  const sentence = `${parts.join('; ')}${more}.`;
  const sways = m.pieces.some((p) => p.slide);
  return { code: sways ? 'sway' : 'mechanism', message: `Nothing stops this motion: ${sentence}` };
}

function placeOf(centre: { x: number; y: number; joint?: string }): string {
  const round = (v: number) => Number(v.toPrecision(4)).toString().replace('-', '−');
  return centre.joint ?? `the point (${round(centre.x)}, ${round(centre.y)})`;
}

function wayOf({ x, y }: { x: number; y: number }): string {
  if (Math.abs(y) <= 1e-6 * Math.abs(x)) return 'sideways';
  if (Math.abs(x) <= 1e-6 * Math.abs(y)) return 'up or down';
  return 'at a slope';
}
