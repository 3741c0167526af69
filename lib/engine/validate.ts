import type { Analysis } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Place, Refusal } from '@/lib/model/refusal';

const refuse = (code: string, message: string, place: Place): Refusal => ({ code, message, place });

/** What a schema cannot see: references, geometry and loads that make no structure. The first fault found, or nothing. */
export function validate(analysis: Analysis): Refusal | undefined {
  return (
    validateJoints(analysis) ?? validateMembers(analysis) ?? validateLoads(analysis) ?? validateAsks(analysis)
  );
}

function validateJoints({ joints }: Analysis): Refusal | undefined {
  const seen = new Map<string, number>();
  const places = new Map<string, string>();
  const size = Math.max(...joints.flatMap((j) => [Math.abs(j.x), Math.abs(j.y)]));
  for (const [i, j] of joints.entries()) {
    const path = `joints.${i}`;
    if (seen.has(j.id))
      return refuse('duplicate-joint', `There are two joints ${j.id}.`, { path, joint: j.id });
    seen.set(j.id, i);
    const grid = size === 0 ? 1 : size * 1e-12;
    const key = `${Math.round(j.x / grid)}:${Math.round(j.y / grid)}`;
    const other = places.get(key);
    if (other !== undefined) {
      return refuse('joints-coincide', `Joints ${other} and ${j.id} stand at the same place.`, {
        path,
        joint: j.id,
      });
    }
    places.set(key, j.id);
  }
  if (
    joints.every((j) => !j.support || [j.support.x, j.support.y, j.support.turn].every((r) => r === 'free'))
  ) {
    return refuse('no-supports', 'The structure has no supports. Hold at least one joint.', {
      path: 'joints',
    });
  }
  return undefined;
}

function validateMembers({ joints, members, basis }: Analysis): Refusal | undefined {
  const at = new Map(joints.map((j) => [j.id, j]));
  const seen = new Set<string>();
  const used = new Set<string>();
  for (const [i, m] of members.entries()) {
    const place = { path: `members.${i}`, member: m.id };
    if (seen.has(m.id)) return refuse('duplicate-member', `There are two members ${m.id}.`, place);
    seen.add(m.id);
    const [a, b] = [at.get(m.start), at.get(m.end)];
    if (!a || !b)
      return refuse(
        'unknown-joint',
        `Member ${m.id} ends at joint ${a ? m.end : m.start}, which does not exist.`,
        place,
      );
    const L = Math.hypot(b.x - a.x, b.y - a.y);
    if (!(L > 0) || m.start === m.end) return refuse('zero-length', `Member ${m.id} has no length.`, place);
    used.add(m.start).add(m.end);
    let from = 0;
    for (const step of m.steps ?? []) {
      if (step.from <= from || step.from >= L)
        return refuse(
          'steps-out-of-order',
          `The steps of member ${m.id} must rise and lie within its length.`,
          place,
        );
      from = step.from;
    }
    const r = m.releases;
    if (r?.start.includes('axial') && r.end.includes('axial'))
      return refuse(
        'released-twice',
        `Member ${m.id} is released along itself at both ends and would slide away.`,
        place,
      );
    if (r?.start.includes('shear') && r.end.includes('shear'))
      return refuse(
        'released-twice',
        `Member ${m.id} is released across at both ends and would drop out.`,
        place,
      );
    const open = basis.kind === 'relative' && basis.EI0 === undefined;
    if (open && [m, ...(m.steps ?? [])].some((s) => s.EA !== undefined || s.GAs !== undefined)) {
      return refuse('needs-EI0', `Member ${m.id} stretches or shears, so EI0 needs its value.`, {
        ...place,
        path: 'basis.EI0',
      });
    }
  }
  const loose = joints.find((j) => !used.has(j.id));
  if (loose)
    return refuse('loose-joint', `Joint ${loose.id} belongs to no member.`, {
      path: `joints.${joints.indexOf(loose)}`,
      joint: loose.id,
    });
  const spring = joints.find(
    (j) => j.support && [j.support.x, j.support.y, j.support.turn].some((r) => typeof r === 'object'),
  );
  if (spring && basis.kind === 'relative' && basis.EI0 === undefined) {
    return refuse('needs-EI0', `Joint ${spring.id} rests on a spring, so EI0 needs its value.`, {
      path: 'basis.EI0',
      joint: spring.id,
    });
  }
  return undefined;
}

function validateLoads(analysis: Analysis): Refusal | undefined {
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
  for (const [i, combination] of analysis.combinations.entries()) {
    const missing = Object.keys(combination.factors).find((id) => !ids.has(id));
    if (missing !== undefined)
      return refuse(
        'unknown-case',
        `Combination ${combination.id} names case ${missing}, which does not exist.`,
        { path: `combinations.${i}` },
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
    if (load.at < 0 || load.at > L)
      return {
        code: 'load-off-member',
        message: `The load stands off member ${member.id}, which is ${Number(L.toPrecision(6))} long.`,
        place,
      };
    return undefined;
  }
  if (load.kind === 'distributed') {
    const [from, to] = [load.from ?? 0, load.to ?? L];
    if (from < 0 || to > L * (1 + 1e-12) || from >= to)
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

function validateAsks(analysis: Analysis): Refusal | undefined {
  const at = new Map(analysis.joints.map((j) => [j.id, j]));
  for (const [i, ask] of analysis.displacements.entries()) {
    const path = `displacements.${i}`;
    const m = analysis.members.find((x) => x.id === ask.member);
    const [a, b] = [at.get(m?.start ?? ''), at.get(m?.end ?? '')];
    if (!m || !a || !b)
      return refuse('unknown-member', `There is no member ${ask.member}.`, { path, member: ask.member });
    if (ask.at < 0 || ask.at > Math.hypot(b.x - a.x, b.y - a.y) * (1 + 1e-12)) {
      return refuse('ask-off-member', `The deflection asked for lies off member ${m.id}.`, {
        path,
        member: m.id,
      });
    }
  }
  return undefined;
}
