import type { Analysis } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Place } from '@/lib/model/refusal';
import type { Joint, Member } from '@/lib/model/structure';
import { offMember } from './snap-places';

/** What loads stand on. */
export interface Parts {
  joints: ReadonlyMap<string, Joint>;
  members: ReadonlyMap<string, Member>;
  lengths: ReadonlyMap<string, number>;
  /** EI0 has no value, so nothing that works against stiffness can be answered. */
  withoutEI0: boolean;
}

interface Fault {
  code: string;
  message: string;
  place: Place;
}

export function partsOf({ basis, joints, members }: Analysis): Parts {
  const at = new Map(joints.map((j) => [j.id, j]));
  const length = ({ start, end }: Member) => {
    const [a, b] = [at.get(start), at.get(end)];
    return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : Number.NaN;
  };
  return {
    joints: at,
    members: new Map(members.map((m) => [m.id, m])),
    lengths: new Map(members.map((m) => [m.id, length(m)])),
    withoutEI0: basis.kind === 'relative' && basis.EI0 === undefined,
  };
}

/** Why a load has nothing to act on, or nothing to act by. */
export function faultOfLoad(load: Load, parts: Parts): Fault | undefined {
  switch (load.kind) {
    case 'self-weight':
      return faultOfWeight(load, parts);
    case 'joint':
      return parts.joints.has(load.joint) ? undefined : unknownJoint(load.joint);
    case 'settlement':
      return faultOfSettlement(load, parts);
    default: {
      const member = parts.members.get(load.member);
      return member ? faultOnMember(load, member, parts) : unknownMember(load.member);
    }
  }
}

const unknownMember = (id: string): Fault => ({
  code: 'unknown-member',
  message: `There is no member ${id}.`,
  place: { member: id },
});

const unknownJoint = (id: string): Fault => ({
  code: 'unknown-joint',
  message: `There is no joint ${id}.`,
  place: { joint: id },
});

const needsEI0 = (what: string): Fault => ({
  code: 'needs-EI0',
  message: `${what} by its stiffness, so EI0 needs its value.`,
  place: { path: 'basis.EI0' },
});

function faultOfWeight(load: Extract<Load, { kind: 'self-weight' }>, { members }: Parts): Fault | undefined {
  const named = load.members ?? [...members.keys()];
  const unknown = named.find((id) => !members.has(id));
  if (unknown !== undefined) return unknownMember(unknown);
  const weightless = (id: string) => members.get(id)?.weight === undefined;
  const light = load.members?.find(weightless);
  if (light === undefined && !named.every(weightless)) return undefined;
  return {
    code: 'no-weight',
    message:
      light === undefined
        ? 'No member has a weight per length.'
        : `Member ${light} has no weight per length stated.`,
    place: { member: light },
  };
}

function faultOfSettlement(load: Extract<Load, { kind: 'settlement' }>, parts: Parts): Fault | undefined {
  const joint = parts.joints.get(load.joint);
  if (!joint) return unknownJoint(load.joint);
  if (joint.support?.[load.component] !== 'held')
    return {
      code: 'settlement-of-free',
      message: `Joint ${load.joint} is not held in that direction, so it has no support that could move.`,
      place: { joint: load.joint },
    };
  return parts.withoutEI0 ? needsEI0('A support movement bends the structure') : undefined;
}

type OnMember = Exclude<Load, { kind: 'self-weight' | 'joint' | 'settlement' }>;

function faultOnMember(load: OnMember, member: Member, parts: Parts): Fault | undefined {
  const L = parts.lengths.get(member.id) ?? Number.NaN;
  const place = { member: member.id };
  const size = `member ${member.id}, which is ${Number(L.toPrecision(6))} long.`;
  switch (load.kind) {
    case 'point':
    case 'couple':
      return offMember(load.at, L)
        ? { code: 'load-off-member', message: `The load stands off ${size}`, place }
        : undefined;
    case 'distributed': {
      const [from, to] = [load.from ?? 0, load.to ?? L];
      return offMember(from, L) || offMember(to, L) || from >= to
        ? { code: 'load-off-member', message: `The load must begin and end on ${size}`, place }
        : undefined;
    }
    default:
      return faultOfStrain(load, member, parts);
  }
}

function faultOfStrain(
  load: Extract<Load, { kind: 'temperature' | 'misfit' }>,
  member: Member,
  { withoutEI0 }: Parts,
): Fault | undefined {
  if (withoutEI0) return needsEI0('Temperature and misfit bend the structure');
  if (load.kind === 'misfit') return undefined;
  const place = { member: member.id };
  if (member.alpha === undefined)
    return { code: 'no-alpha', message: `Member ${member.id} needs its coefficient of expansion.`, place };
  if (load.difference !== 0 && member.depth === undefined)
    return {
      code: 'no-depth',
      message: `Member ${member.id} needs its depth for a temperature difference.`,
      place,
    };
  return undefined;
}
