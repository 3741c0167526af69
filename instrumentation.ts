/** Starts the workers with the server; several servers may run them at once. */
export async function register(): Promise<void> {
  // Next.js writes this name out while building and so drops the import where there is no Node.
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { startMailWorker } = await import('./lib/services/mail-worker');
    const { startNightWorker } = await import('./lib/services/night-worker');
    startMailWorker();
    startNightWorker();
  }
}
