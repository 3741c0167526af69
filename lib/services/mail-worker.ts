// server only
import { log } from '@/lib/log';
import { deliverMail } from './deliver-mail';

const pause = 1_000;
const place = globalThis as { fairhandMailWorker?: true };

/** Looks for due mail every second and sends it. Started once in a process. */
export function startMailWorker(): void {
  if (place.fairhandMailWorker) return;
  place.fairhandMailWorker = true;
  const look = async () => {
    try {
      while (await deliverMail());
    } catch (error) {
      log.error({ err: error }, 'the mail queue could not be read');
    }
    setTimeout(look, pause).unref();
  };
  setTimeout(look, pause).unref();
}
