import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import type { Equilibrium } from './equilibrium';
import { forceName, listed } from './name-force';

type Piece = Mechanism['pieces'][number];

/**
 * Code and sentence for a motion, in the trade's words: what moves, how, and why nothing stops it. `released` are the
 * redundants taken away, when it is a primary structure that moves.
 */
export function describeMechanism(
  eq: Equilibrium,
  m: Mechanism,
  released: readonly Quantity[] = [],
): { code: string; message: string } {
  const [piece] = m.pieces;
  if (!piece) {
    const joint = Object.keys(m.joints)[0];
    return {
      code: 'joint-turns',
      message: `Joint ${joint ?? ''} can turn without any force.`.replace('  ', ' '),
    };
  }
  if (m.pieces.length === 1 && piece.members.length === eq.bars.length)
    return wholeMoves(eq, piece, released);
  if (m.pieces.length === 1 && unconnected(eq, piece)) return pieceIsLoose(piece);
  const sways = m.pieces.some((p) => p.slide) && m.pieces.some((p) => p.centre);
  const shown = m.pieces.slice(0, 4).map((p) => motionOf(p, m));
  const more = m.pieces.length > 4 ? ', and others move with them' : '';
  const code = sways ? 'sway' : m.pieces.some((p) => p.slide) ? 'slides' : 'mechanism';
  const lead = sways ? 'Nothing stops sway: ' : `${leadOf(eq, m)}`;
  return { code, message: capital(`${lead}${shown.join(', ')}${more}.`) };
}

/** All reactions are parallel, or pass through one point. */
function wholeMoves(
  eq: Equilibrium,
  piece: Piece,
  released: readonly Quantity[],
): { code: string; message: string } {
  const gone = new Set(released.map(quantityKey));
  const left = eq.quantities.filter((q) => q.kind === 'reaction' && !gone.has(quantityKey(q)));
  const remain = released.length > 0 ? 'The reactions that remain' : 'The reactions';
  if (piece.slide) {
    const way = wayOf(piece.slide);
    if (left.length === 0)
      return { code: 'parallel', message: `No reaction is left: nothing stops sliding ${way}.` };
    const all = way === 'sideways' ? 'vertical' : way === 'up and down' ? 'horizontal' : 'parallel';
    return { code: 'parallel', message: `${remain} are all ${all}: nothing stops sliding ${way}.` };
  }
  const place = piece.centre ? placeOf(piece.centre) : 'itself';
  const [only] = left;
  if (only && left.length === 1)
    return {
      code: 'concurrent',
      message: `Only ${forceName(eq, only)} is left: nothing stops rotation about ${place}.`,
    };
  const names = listed(left.map((q) => forceName(eq, q)));
  return {
    code: 'concurrent',
    message: `${remain}, ${names}, all pass through ${place}: nothing stops rotation about ${place}.`,
  };
}

/** No joint of the piece belongs to a member outside it. */
function unconnected(eq: Equilibrium, piece: Piece): boolean {
  const inside = new Set(piece.members);
  const own = new Set(eq.bars.filter((b) => inside.has(b.member.id)).flatMap((b) => [b.start, b.end]));
  return !eq.bars.some((b) => !inside.has(b.member.id) && (own.has(b.start) || own.has(b.end)));
}

function pieceIsLoose(piece: Piece): { code: string; message: string } {
  const what = nameOf(piece);
  const move = piece.slide
    ? `slides ${wayOf(piece.slide)}`
    : `turns about ${piece.centre ? placeOf(piece.centre) : 'itself'}`;
  return {
    code: 'not-connected',
    message: `${capital(what)} is not connected to the rest, and its own supports do not hold it: it ${move}.`,
  };
}

/** "B drops: " when two pieces turn about different points and share a joint that moves. */
function leadOf(eq: Equilibrium, m: Mechanism): string {
  const turning = m.pieces.filter((p) => p.centre);
  if (turning.length < 2) return '';
  const endsOf = (p: Piece) =>
    new Set(eq.analysis.members.filter((b) => p.members.includes(b.id)).flatMap((b) => [b.start, b.end]));
  const [a, b] = turning.map(endsOf);
  const joint = [...(a ?? [])].find((id) => b?.has(id) && m.joints[id]);
  const move = joint === undefined ? undefined : m.joints[joint];
  if (joint === undefined || !move) return '';
  return Math.abs(move.y) >= Math.abs(move.x) ? `${joint} drops: ` : `${joint} moves sideways: `;
}

function motionOf(p: Piece, m: Mechanism): string {
  if (!p.centre) return `${nameOf(p)} slides ${wayOf(p.slide ?? { x: 0, y: 0 })}`;
  const hinge = m.pieces.length === 1 && p.centre.joint !== undefined;
  return `${nameOf(p)} turns about ${hinge ? `the hinge at ${p.centre.joint}` : placeOf(p.centre)}`;
}

function nameOf(p: Piece): string {
  return p.members.length === 1 ? `member ${p.members[0]}` : `the piece ${listed(p.members, 5)}`;
}

const capital = (s: string) =>
  /^(member|the|nothing)\b/.test(s) ? s.charAt(0).toUpperCase() + s.slice(1) : s;

function placeOf(centre: { x: number; y: number; joint?: string }): string {
  const round = (v: number) => Number(v.toPrecision(4)).toString().replace('-', '−');
  return centre.joint ?? `the point (${round(centre.x)}, ${round(centre.y)})`;
}

/** Slopes below this count as none. */
const level = 1e-6;

function wayOf({ x, y }: { x: number; y: number }): string {
  if (Math.abs(y) <= level * Math.abs(x)) return 'sideways';
  if (Math.abs(x) <= level * Math.abs(y)) return 'up and down';
  return 'at a slope';
}
