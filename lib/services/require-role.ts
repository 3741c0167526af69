import type { Actor, Role } from './actor';
import { NotAllowed } from './service-error';

/** The first line of every verb that a signed-in person calls. */
export function requireRole(actor: Actor, ...any: Role[]): void {
  if (!any.some((r) => actor.roles.includes(r)))
    throw new NotAllowed(`${actor.initials} has none of: ${any.join(', ')}`);
}

export const everyone: Role[] = ['administrator', 'engineer', 'checker', 'engineer-of-record'];
export const makers: Role[] = ['engineer', 'engineer-of-record'];
