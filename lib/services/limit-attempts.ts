// server only
import { database } from '@/db/connection';
import { countAttempts, forgetAttempts, insertAttempt } from '@/db/queries/attempts';

const window = 15 * 60_000;

/**
 * Whether one more try is allowed in a quarter of an hour. The try is written down before it is counted, so that of many
 * at the same instant no more than `most` pass.
 */
export async function allowAttempt(subject: string, most: number): Promise<boolean> {
  const now = new Date();
  const since = new Date(now.getTime() - window);
  if ((await countAttempts(database(), subject, since)) >= most) return false;
  await insertAttempt(database(), subject, now);
  return (await countAttempts(database(), subject, since)) <= most;
}

/** Forgets the tries of a subject after one that was right. */
export async function forgiveAttempts(subject: string): Promise<void> {
  await forgetAttempts(database(), subject);
}

export const tooOften = 'There were too many tries. Wait a quarter of an hour, then try again.';
