import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import type { Role } from '@/lib/services/actor';
import { startSession } from '@/lib/services/session';
import { type Filled, fillRecord } from '../database/fill-record';
import { makeOffice, type Office } from '../database/office-factory';
import { site } from './browser';
import { type Door, doors } from './door-list';

let filled: Filled;
let foreign: Office;
beforeAll(async () => {
  filled = await fillRecord();
  foreign = await makeOffice();
}, 120_000);
afterAll(() => database().destroy());

const roles: Role[] = ['administrator', 'engineer', 'checker', 'engineer-of-record'];

/** Every page and route handler, as Next.js names them by folder. */
function routesOf(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (entry.isDirectory()) return routesOf(join(folder, entry.name));
    return /^(page\.tsx|route\.ts)$/.test(entry.name) ? [folder.replace(/^app/, '') || '/'] : [];
  });
}

/** The status of one door for a person who has exactly these roles; no person: nobody is signed in. */
async function statusFor(door: Door, personId?: string, officeId?: string): Promise<number> {
  const session = personId && officeId ? await startSession(personId, officeId) : undefined;
  const answer = await fetch(site() + door.path(filled), {
    method: door.method ?? 'GET',
    redirect: 'manual',
    headers: {
      'sec-fetch-site': 'same-origin',
      ...(session ? { cookie: `fairhand_session=${session.token}` } : {}),
    },
  });
  const text = await answer.text();
  // A page that began to stream says in its text where it sends the visitor.
  if (answer.status === 200 && text.includes('NEXT_REDIRECT;replace;/sign-in')) return 307;
  return answer.status;
}

async function withRoles(personId: string, held: Role[]): Promise<void> {
  await database()('people')
    .where({ id: personId })
    .update({ roles: JSON.stringify(held) });
}

describe('every door of the site', () => {
  it('is in the list of doors', () => {
    expect(doors.map((d) => d.route).sort()).toEqual(routesOf('app').sort());
  });

  it.each(doors.filter((d) => !d.open).map((d) => [d.route, d] as const))(
    '%s sends a stranger away',
    async (_route, door) => {
      expect([303, 307, 401]).toContain(await statusFor(door));
    },
  );

  it.each(doors.filter((d) => !d.open && d.thing).map((d) => [d.route, d] as const))(
    '%s is not there for another office',
    async (_route, door) => {
      const visitor = foreign.people.administrator;
      await withRoles(visitor.personId, roles);
      expect(await statusFor(door, visitor.personId, foreign.id)).toBe(404);
    },
  );

  const cases = doors.flatMap((d) =>
    d.open
      ? []
      : roles.map((role) => [d.route, d.roles.includes(role) ? 'opens for' : 'refuses', role, d] as const),
  );
  it.each(cases)('%s %s %s', async (_route, _says, role, door) => {
    // Somebody of the office who has no part in the job, so that the role alone decides.
    const { personId } = filled.office.people.administrator;
    await withRoles(personId, [role]);
    const status = await statusFor(door, personId, filled.office.id);
    expect(status).toBe(door.roles.includes(role) ? (door.status ?? 200) : 403);
  });
});

describe('every action of a form', () => {
  const files = (readdirSync('app', { recursive: true }) as string[])
    .map((name) => join('app', name))
    .filter((name) => /\.tsx?$/.test(name) && readFileSync(name, 'utf8').startsWith("'use server'"));

  /** Each that works for somebody without a session, and how it knows them instead. */
  const withoutSession: Record<string, RegExp> = {
    'app/forgotten-password/actions.ts': /askPasswordReset\(.+requestAddress\(\)\)/,
    'app/invitation/[token]/actions.ts': /acceptInvitation\(/,
    'app/reset-password/[token]/actions.ts': /resetPassword\(/,
    'app/review/[token]/actions.ts': /reviewDoor\(token, await requestAddress\(\)\)/,
    'app/sign-in/actions.ts': /signIn\(.+requestAddress\(\)\)/,
    'app/sign-in/second-step/actions.ts': /answerSecondStep\([\s\S]+requestAddress\(\)/,
    'app/sign-in/leave.ts': /leaveSession\(\)/,
  };

  it.each(files)('%s asks who is there', (file) => {
    const actions = readFileSync(file, 'utf8')
      .split(/^export async function /m)
      .slice(1);
    expect(actions.length).toBeGreaterThan(0);
    const known = withoutSession[file];
    for (const body of actions) {
      if (known) expect(body).toMatch(known);
      else expect(/await (\w+)/.exec(body)?.[1]).toBe('requireActor');
    }
  });
});

describe('what the browser is told', () => {
  it('runs only scripts that carry the nonce of this one answer', async () => {
    const policies = await Promise.all(
      [1, 2].map(async () => (await fetch(`${site()}/sign-in`)).headers.get('content-security-policy')),
    );
    const nonces = policies.map((policy) => /script-src 'self' 'nonce-([^']+)'/.exec(policy ?? '')?.[1]);
    expect(nonces[0]).toMatch(/^[\w+/]{22}==$/);
    expect(nonces[0]).not.toBe(nonces[1]);
    expect(policies[0]).not.toMatch(/script-src[^;]*unsafe/);
  });

  it('lets a worker reach nothing but its own script', async () => {
    const page = await (await fetch(`${site()}/sign-in`)).text();
    const script = /\/_next\/static\/[^"]+\.js/.exec(page)?.[0];
    const answer = await fetch(site() + script, { headers: { 'sec-fetch-dest': 'worker' } });
    expect(answer.headers.get('content-security-policy')).toContain("connect-src 'none'");
  });
});

describe('a door that changes something', () => {
  it('stays shut for a request that comes from another site', async () => {
    const { personId } = filled.office.people.engineer;
    const session = await startSession(personId, filled.office.id);
    const answer = await fetch(`${site()}/jobs/${filled.jobId}/export`, {
      method: 'POST',
      headers: { 'sec-fetch-site': 'cross-site', cookie: `fairhand_session=${session.token}` },
    });
    expect(answer.status).toBe(403);
  });
});
