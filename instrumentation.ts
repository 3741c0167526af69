import { env } from './lib/env';

/** Starts the mail worker with the server; several servers may run it at once. */
export async function register(): Promise<void> {
  if (env().edge) return;
  const { startMailWorker } = await import('./lib/services/mail-worker');
  startMailWorker();
}
