import type { Analysis } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import type { Joint } from '@/lib/model/structure';

/** Joints nearer to each other than this part of the whole size stand at one place. */
const together = 1e-9;

/** Names, places and supports of the joints. */
export function validateJoints({ joints }: Analysis): Refusal | undefined {
  const seen = new Set<string>();
  for (const [i, j] of joints.entries()) {
    if (seen.has(j.id)) return at(joints, i, 'duplicate-joint', `There are two joints ${j.id}.`);
    seen.add(j.id);
  }
  const pair = coinciding(joints);
  if (pair) {
    const [a, b] = pair;
    const names = [joints[a]?.id, joints[b]?.id];
    return at(joints, b, 'joints-coincide', `Joints ${names[0]} and ${names[1]} stand at the same place.`);
  }
  const held = joints.some(
    (j) => j.support && [j.support.x, j.support.y, j.support.turn].some((r) => r !== 'free'),
  );
  return held
    ? undefined
    : {
        code: 'no-supports',
        message: 'The structure has no supports. Hold at least one joint.',
        place: { path: 'joints' },
      };
}

function at(joints: readonly Joint[], i: number, code: string, message: string): Refusal {
  return { code, message, place: { path: `joints.${i}`, joint: joints[i]?.id } };
}

/** The first two joints at one place, found among neighbours in order of x. */
function coinciding(joints: readonly Joint[]): [number, number] | undefined {
  const xs = joints.map((j) => j.x);
  const ys = joints.map((j) => j.y);
  const span = (v: number[]) =>
    v.reduce((m, x) => Math.max(m, x), v[0] as number) - v.reduce((m, x) => Math.min(m, x), v[0] as number);
  const near = together * Math.max(span(xs), span(ys));
  const order = joints
    .map((_, i) => i)
    .sort((a, b) => (xs[a] as number) - (xs[b] as number) || (ys[a] as number) - (ys[b] as number));
  for (const [k, a] of order.entries()) {
    for (let n = k + 1; n < order.length; n++) {
      const b = order[n] as number;
      if ((xs[b] as number) - (xs[a] as number) > near) break;
      if (Math.abs((ys[b] as number) - (ys[a] as number)) <= near) return [Math.min(a, b), Math.max(a, b)];
    }
  }
  return undefined;
}
