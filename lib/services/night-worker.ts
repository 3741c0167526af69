// server only
import { database } from '@/db/connection';
import { deleteExpired } from '@/db/queries/expired';
import { queueMail } from '@/db/queries/mails';
import { peopleOf } from '@/db/queries/people';
import { insertWalk, officesNotWalked } from '@/db/queries/record-walks';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { sayBreak } from './say-break';
import { walkAudit } from './verify-audit';

const hour = 3_600_000;
const place = globalThis as { fairhandNightWorker?: true };

/** Every hour clears what has expired and walks the records that were not walked today. Started once in a process. */
export function startNightWorker(): void {
  if (place.fairhandNightWorker) return;
  place.fairhandNightWorker = true;
  const work = async () => {
    try {
      const gone = await deleteExpired(database(), new Date());
      if (gone > 0) log.info({ rows: gone }, 'cleared what had expired');
      await verifyAllOffices(new Date());
    } catch (error) {
      log.error({ err: error }, 'the work of the night failed');
    }
    setTimeout(work, hour).unref();
  };
  setTimeout(work, hour).unref();
}

/**
 * Walks the record of every office once a day (UTC), whichever server comes first. A broken one goes to the log as an
 * error and to the administrators of the office by mail. Answers the offices that this walk found broken.
 */
export async function verifyAllOffices(now: Date): Promise<string[]> {
  const broken: string[] = [];
  const day = now.toISOString().slice(0, 10);
  for (const officeId of await officesNotWalked(database(), day)) {
    const report = await walkAudit(officeId);
    await database().transaction(async (trx) => {
      const found = { at: now, entries: report.entries, broken: report.broken ?? null };
      if (!(await insertWalk(trx, officeId, day, found)) || report.broken === undefined) return;
      broken.push(officeId);
      log.error({ officeId, entry: report.broken }, 'the record of an office does not hold together');
      for (const person of await peopleOf(trx, officeId)) {
        if (Number(person.active) !== 1 || !person.roles.includes('administrator')) continue;
        await queueMail(trx, {
          officeId,
          recipient: person.email,
          subject: 'The record of the office does not hold together',
          body: `${person.name},\n\n${sayBreak(report.broken, report.entries)}\n\n${env().appUrl}/office/record\n`,
        });
      }
    });
  }
  return broken;
}
