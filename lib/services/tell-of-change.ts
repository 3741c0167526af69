// server only
import type { Knex } from 'knex';
import type { JobRow } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import type { SheetRow } from '@/db/queries/sheets';
import { env } from '@/lib/env';
import type { Actor } from './actor';
import type { TouchedSubmittals } from './void-submittals';

export interface Change {
  job: JobRow;
  sheet: SheetRow;
  /** Sheet and revision, as "S-03 revision 2". */
  name: string;
  reason: string;
  /** People whose checks are void. */
  checkers: string[];
  submittals: TouchedSubmittals;
}

/** Writes to everyone whose check or submittal a new revision touches, except to the one who froze it. */
export async function tellOfChange(trx: Knex.Transaction, actor: Actor, change: Change): Promise<void> {
  const { job, sheet, name, reason, checkers, submittals } = change;
  const { voided, standing } = submittals;
  const concerned = new Set(checkers);
  for (const s of [...voided, ...standing]) concerned.add(s.created_by).add(s.engineer_id);
  concerned.delete(actor.personId);
  if (concerned.size === 0) return;
  const numbers = (of: { number: number }[]) => of.map((s) => s.number).join(', ');
  const lines = [
    `${actor.name} froze ${name}, ${sheet.title}, of ${job.number} ${job.title}: ${reason}`,
    '',
    'Checks of its earlier revisions are void.',
    ...(voided.length === 0 ? [] : [`Not sent and void by now: submittal ${numbers(voided)}.`]),
    ...(standing.length === 0
      ? []
      : [
          `Submittal ${numbers(standing)} holds an earlier revision. It stands as it was sent; the change goes out with the next submittal.`,
        ]),
    '',
    `${env().appUrl}/jobs/${job.id}`,
  ];
  for (const person of await peopleOf(trx, actor.officeId)) {
    if (!concerned.has(person.id) || Number(person.active) !== 1) continue;
    await queueMail(trx, {
      officeId: actor.officeId,
      recipient: person.email,
      subject: `${job.number}: ${name} takes the place of what you vouched for`,
      body: `${person.name},\n\n${lines.join('\n')}\n`,
    });
  }
}
