import type { Load } from '@/lib/model/load';

/** Loads of a case that may act on a member: its own, in their order, and own weight, which is everybody's. */
export function loadsByMember(loads: readonly Load[]): (member: string) => readonly Load[] {
  const everybody = loads.filter((l) => l.kind === 'self-weight');
  const own = new Map<string, Load[]>();
  for (const load of loads) {
    if (load.kind === 'self-weight' || load.kind === 'joint' || load.kind === 'settlement') continue;
    const list = own.get(load.member);
    if (list) list.push(load);
    else own.set(load.member, [load]);
  }
  return (member) => [...everybody, ...(own.get(member) ?? [])];
}
