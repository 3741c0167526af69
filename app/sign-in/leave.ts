'use server';

import { redirect } from 'next/navigation';
import { leaveSession } from '../session';

/** Signs out. */
export async function leave(): Promise<void> {
  await leaveSession();
  redirect('/sign-in');
}
