import type { Member } from '@/lib/model/structure';
import type { KnownEnds } from './displacements';
import type { MemberAxis } from './local-loads';

/** Displacement of a joint; the rotation is absent where nothing could turn it. */
export interface JointMotion {
  x: number;
  y: number;
  rotation?: number;
}

/** What two joints tell of the ends of a member between them, as far as its releases let them. */
export function knownEnds(member: Member, axis: MemberAxis, start: JointMotion, end: JointMotion): KnownEnds {
  const free = (at: 'start' | 'end', what: 'moment' | 'shear' | 'axial') =>
    member.releases?.[at].includes(what) === true;
  const along = (j: JointMotion) => j.x * axis.c + j.y * axis.s;
  const across = (j: JointMotion) => j.y * axis.c - j.x * axis.s;
  return {
    along0: free('start', 'axial') ? undefined : along(start),
    along1: free('end', 'axial') ? undefined : along(end),
    across0: free('start', 'shear') ? undefined : across(start),
    across1: free('end', 'shear') ? undefined : across(end),
    rotation0: free('start', 'moment') ? undefined : start.rotation,
    rotation1: free('end', 'moment') ? undefined : end.rotation,
  };
}
