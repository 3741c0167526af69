// server only
import { database } from '@/db/connection';
import { deleteExpired, officeIds } from '@/db/queries/expired';
import { log } from '@/lib/log';
import { walkAudit } from './verify-audit';

const hour = 3_600_000;
const place = globalThis as { fairhandNightWorker?: true };

/** Clears what has expired every hour, and once a day walks the record of every office. Started once in a process. */
export function startNightWorker(): void {
  if (place.fairhandNightWorker) return;
  place.fairhandNightWorker = true;
  let hours = 0;
  const work = async () => {
    try {
      const gone = await deleteExpired(database(), new Date());
      if (gone > 0) log.info({ rows: gone }, 'cleared what had expired');
      if (++hours % 24 === 0) await verifyAllOffices();
    } catch (error) {
      log.error({ err: error }, 'the work of the night failed');
    }
    setTimeout(work, hour).unref();
  };
  setTimeout(work, hour).unref();
}

/** Walks the record of every office; a broken chain goes to the log as an error. Answers the offices whose record is broken. */
export async function verifyAllOffices(): Promise<string[]> {
  const broken: string[] = [];
  for (const officeId of await officeIds(database())) {
    const report = await walkAudit(officeId);
    if (report.broken === undefined) continue;
    broken.push(officeId);
    log.error({ officeId, entry: report.broken }, 'the record of an office does not hold together');
  }
  return broken;
}
