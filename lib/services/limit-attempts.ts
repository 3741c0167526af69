// server only
import { database } from '@/db/connection';
import { countAttempts, insertAttempt } from '@/db/queries/attempts';

const window = 15 * 60_000;

/** Whether one more try is allowed in a quarter of an hour; the try is counted. */
export async function allowAttempt(subject: string, most: number): Promise<boolean> {
  const since = new Date(Date.now() - window);
  const tries = await countAttempts(database(), subject, since);
  if (tries >= most) return false;
  await insertAttempt(database(), subject, new Date());
  return true;
}

export const tooOften = 'There were too many tries. Wait a quarter of an hour, then try again.';
