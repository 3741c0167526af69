// server only
import { cookies, headers } from 'next/headers';
import { forbidden, notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { env } from '@/lib/env';
import type { Actor } from '@/lib/services/actor';
import { NotAllowed, NotFound } from '@/lib/services/service-error';
import { endSession, readSession } from '@/lib/services/session';

const cookieName = 'fairhand_session';

/** Who is signed in, if anyone; read once a request. */
export const currentActor = cache(async (): Promise<Actor | undefined> => {
  const token = (await cookies()).get(cookieName)?.value;
  return token ? readSession(token) : undefined;
});

/** The token of the session of this request; empty without one. */
export async function sessionToken(): Promise<string> {
  return (await cookies()).get(cookieName)?.value ?? '';
}

/** Who is signed in; everyone else is sent to the sign-in page. */
export async function requireActor(): Promise<Actor> {
  return (await currentActor()) ?? redirect('/sign-in');
}

export async function keepSession(session: { token: string; expiresAt: Date }): Promise<void> {
  (await cookies()).set(cookieName, session.token, {
    httpOnly: true,
    sameSite: 'lax',
    secure: env().appUrl.startsWith('https:'),
    path: '/',
    expires: session.expiresAt,
  });
}

export async function leaveSession(): Promise<void> {
  const jar = await cookies();
  const token = jar.get(cookieName)?.value;
  if (token) await endSession(token);
  jar.delete(cookieName);
}

const stepName = 'fairhand_step';

/** Keeps the token of a sign-in that waits for its second step. */
export async function keepStep(step: { token: string; expiresAt: Date }): Promise<void> {
  (await cookies()).set(stepName, step.token, {
    httpOnly: true,
    sameSite: 'strict',
    secure: env().appUrl.startsWith('https:'),
    path: '/sign-in',
    expires: step.expiresAt,
  });
}

export async function readStep(): Promise<string | undefined> {
  return (await cookies()).get(stepName)?.value;
}

export async function leaveStep(): Promise<void> {
  (await cookies()).delete({ name: stepName, path: '/sign-in' });
}

/** The address a request comes from, as the nearest proxy says it; only for counting attempts. */
export async function requestAddress(): Promise<string> {
  const list = await headers();
  return list.get('x-forwarded-for')?.split(',').at(-1)?.trim() || 'direct';
}

/** What a service answers; its refusals become the pages for them. */
export async function orRefuse<T>(answer: Promise<T>): Promise<T> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof NotAllowed) forbidden();
    if (error instanceof NotFound) notFound();
    throw error;
  }
}
