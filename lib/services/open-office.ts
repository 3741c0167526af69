// server only
import { database } from '@/db/connection';
import { authoritiesOf } from '@/db/queries/jobs';
import { officeById } from '@/db/queries/offices';
import { licencesOf, peopleOf } from '@/db/queries/people';
import { peopleWithSecondFactor } from '@/db/queries/second-factors';
import { type Actor, role } from './actor';
import { everyone, requireRole } from './require-role';

/** The office's people with their licences, and the authorities it submits to. */
export async function openOffice(actor: Actor) {
  requireRole(actor, ...everyone);
  const db = database();
  const [office, people, licences, authorities, withSecond] = await Promise.all([
    officeById(db, actor.officeId),
    peopleOf(db, actor.officeId),
    licencesOf(db, actor.officeId),
    authoritiesOf(db, actor.officeId),
    peopleWithSecondFactor(db, actor.officeId),
  ]);
  if (!office) throw new Error('the office of a signed-in person is gone');
  return {
    settings: { lateAfter: office.late_after, sealNeedsSecond: Number(office.seal_needs_second) === 1 },
    people: people.map((p) => ({
      id: p.id,
      name: p.name,
      email: p.email,
      initials: p.initials,
      organisation: p.organisation,
      roles: role.array().parse(p.roles),
      active: Number(p.active) === 1,
      secondFactor: withSecond.includes(p.id),
      licences: licences
        .filter((l) => l.person_id === p.id)
        .map((l) => ({
          id: l.id,
          jurisdiction: l.jurisdiction,
          profession: l.profession,
          number: l.number,
          expires: l.expires.toISOString().slice(0, 10),
        })),
    })),
    authorities: authorities.map((a) => ({
      id: a.id,
      name: a.name,
      decisions: a.decisions,
      reviewer: a.reviewer,
      email: a.email,
      wish: a.wish,
      checklist: a.checklist,
    })),
  };
}
