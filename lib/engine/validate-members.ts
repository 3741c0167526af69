import type { Analysis } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import type { Joint, Member } from '@/lib/model/structure';

/** Names, ends, steps and releases of the members, and whether their stiffness needs the value of EI0. */
export function validateMembers({ joints, members, basis }: Analysis): Refusal | undefined {
  const at = new Map(joints.map((j) => [j.id, j]));
  const seen = new Set<string>();
  const used = new Set<string>();
  const open = basis.kind === 'relative' && basis.EI0 === undefined;
  for (const [i, m] of members.entries()) {
    const place = { path: `members.${i}`, member: m.id };
    if (seen.has(m.id)) return { code: 'duplicate-member', message: `There are two members ${m.id}.`, place };
    seen.add(m.id);
    const fault = faultOfEnds(m, at) ?? faultOfReleases(m);
    if (fault) return { ...fault, place };
    used.add(m.start).add(m.end);
    if (open && [m, ...(m.steps ?? [])].some((s) => s.EA !== undefined || s.GAs !== undefined))
      return {
        code: 'needs-EI0',
        message: `Member ${m.id} stretches or shears, so EI0 needs its value.`,
        place: { ...place, path: 'basis.EI0' },
      };
  }
  const loose = joints.findIndex((j) => !used.has(j.id));
  if (loose !== -1)
    return {
      code: 'loose-joint',
      message: `Joint ${joints[loose]?.id} belongs to no member.`,
      place: { path: `joints.${loose}`, joint: joints[loose]?.id },
    };
  const spring = joints.find(
    (j) => j.support && [j.support.x, j.support.y, j.support.turn].some((r) => typeof r === 'object'),
  );
  return spring && open
    ? {
        code: 'needs-EI0',
        message: `Joint ${spring.id} rests on a spring, so EI0 needs its value.`,
        place: { path: 'basis.EI0', joint: spring.id },
      }
    : undefined;
}

type Fault = { code: string; message: string };

function faultOfEnds(m: Member, at: ReadonlyMap<string, Joint>): Fault | undefined {
  const [a, b] = [at.get(m.start), at.get(m.end)];
  if (!a || !b) {
    const message = `Member ${m.id} ends at joint ${a ? m.end : m.start}, which does not exist.`;
    return { code: 'unknown-joint', message };
  }
  const L = Math.hypot(b.x - a.x, b.y - a.y);
  if (m.start === m.end || !(L > 0)) return { code: 'zero-length', message: `Member ${m.id} has no length.` };
  let from = 0;
  for (const step of m.steps ?? []) {
    if (step.from <= from || step.from >= L)
      return {
        code: 'steps-out-of-order',
        message: `The steps of member ${m.id} must rise and lie within its length.`,
      };
    from = step.from;
  }
  return undefined;
}

/** Releases that leave a member nothing to carry with, by themselves. */
function faultOfReleases({ id, releases }: Member): Fault | undefined {
  if (!releases) return undefined;
  const count = (what: 'moment' | 'shear' | 'axial') =>
    Number(releases.start.includes(what)) + Number(releases.end.includes(what));
  const twice = (how: string): Fault => ({
    code: 'released-twice',
    message: `Member ${id} is released ${how}`,
  });
  if (count('axial') === 2) return twice('along itself at both ends and would slide away.');
  if (count('shear') === 2) return twice('across at both ends and would drop out.');
  if (count('shear') === 1 && count('moment') === 2)
    return twice('across and for moment at both ends: nothing keeps it from turning.');
  return undefined;
}
