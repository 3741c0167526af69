import type { Analysis } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Place, Refusal } from '@/lib/model/refusal';
import { offMember } from './snap-places';

const refuse = (code: string, message: string, place: Place): Refusal => ({ code, message, place });

/** Names of cases and combinations, and whether every load has something to act on. */
export function validateLoads(analysis: Analysis): Refusal | undefined {
  const ids = new Set<string>();
  const members = new Map(analysis.members.map((m) => [m.id, m]));
  const at = new Map(analysis.joints.map((j) => [j.id, j]));
  const lengths = new Map(
    analysis.members.map((m) => {
      const [a, b] = [at.get(m.start), at.get(m.end)];
      return [m.id, a && b ? Math.hypot(b.x - a.x, b.y - a.y) : Number.NaN];
    }),
  );
  for (const [k, c] of analysis.cases.entries()) {
    if (ids.has(c.id))
      return refuse('duplicate-case', `There are two cases ${c.id}.`, { path: `cases.${k}`, case: c.id });
    ids.add(c.id);
    for (const [i, load] of c.loads.entries()) {
      const place = { path: `cases.${k}.loads.${i}`, case: c.id, load: i };
      const fault = faultOfLoad(load, analysis, members, at, lengths);
      if (fault) return refuse(fault.code, fault.message, { ...place, ...fault.place });
    }
  }
  const names = new Set<string>();
  for (const [i, combination] of analysis.combinations.entries()) {
    const path = `combinations.${i}`;
    if (names.has(combination.id))
      return refuse('duplicate-combination', `There are two combinations ${combination.id}.`, { path });
    names.add(combination.id);
    const missing = Object.keys(combination.factors).find((id) => !ids.has(id));
    if (missing !== undefined)
      return refuse(
        'unknown-case',
        `Combination ${combination.id} names case ${missing}, which does not exist.`,
        { path },
      );
  }
  return undefined;
}

function faultOfLoad(
  load: Load,
  analysis: Analysis,
  members: ReadonlyMap<string, Analysis['members'][number]>,
  joints: ReadonlyMap<string, Analysis['joints'][number]>,
  lengths: ReadonlyMap<string, number>,
): { code: string; message: string; place: Place } | undefined {
  if (load.kind === 'self-weight') {
    const named = load.members ?? [...members.keys()];
    const unknown = named.find((id) => !members.has(id));
    if (unknown !== undefined)
      return {
        code: 'unknown-member',
        message: `There is no member ${unknown}.`,
        place: { member: unknown },
      };
    const light = load.members?.find((id) => members.get(id)?.weight === undefined);
    if (light !== undefined || named.every((id) => members.get(id)?.weight === undefined)) {
      return {
        code: 'no-weight',
        message: `${light === undefined ? 'No member' : `Member ${light}`} has a weight per length${light === undefined ? '' : ' stated'}.`,
        place: { member: light },
      };
    }
    return undefined;
  }
  const needs = analysis.basis.kind === 'relative' && analysis.basis.EI0 === undefined;
  if (load.kind === 'joint' || load.kind === 'settlement') {
    const joint = joints.get(load.joint);
    if (!joint)
      return {
        code: 'unknown-joint',
        message: `There is no joint ${load.joint}.`,
        place: { joint: load.joint },
      };
    if (load.kind === 'joint') return undefined;
    if (joint.support?.[load.component] !== 'held') {
      return {
        code: 'settlement-of-free',
        message: `Joint ${load.joint} is not held in that direction, so it has no support that could move.`,
        place: { joint: load.joint },
      };
    }
    return needs
      ? {
          code: 'needs-EI0',
          message: 'A support movement bends the structure by its stiffness, so EI0 needs its value.',
          place: { path: 'basis.EI0' },
        }
      : undefined;
  }
  const member = members.get(load.member);
  const L = lengths.get(load.member);
  if (!member || L === undefined)
    return {
      code: 'unknown-member',
      message: `There is no member ${load.member}.`,
      place: { member: load.member },
    };
  const place = { member: member.id };
  if (load.kind === 'point' || load.kind === 'couple') {
    if (offMember(load.at, L))
      return {
        code: 'load-off-member',
        message: `The load stands off member ${member.id}, which is ${Number(L.toPrecision(6))} long.`,
        place,
      };
    return undefined;
  }
  if (load.kind === 'distributed') {
    const [from, to] = [load.from ?? 0, load.to ?? L];
    if (offMember(from, L) || offMember(to, L) || from >= to)
      return {
        code: 'load-off-member',
        message: `The load must begin and end on member ${member.id}, which is ${Number(L.toPrecision(6))} long.`,
        place,
      };
    return undefined;
  }
  if (needs)
    return {
      code: 'needs-EI0',
      message: 'Temperature and misfit bend the structure by its stiffness, so EI0 needs its value.',
      place: { path: 'basis.EI0' },
    };
  if (load.kind === 'temperature' && member.alpha === undefined)
    return { code: 'no-alpha', message: `Member ${member.id} needs its coefficient of expansion.`, place };
  if (load.kind === 'temperature' && load.difference !== 0 && member.depth === undefined)
    return {
      code: 'no-depth',
      message: `Member ${member.id} needs its depth for a temperature difference.`,
      place,
    };
  return undefined;
}
