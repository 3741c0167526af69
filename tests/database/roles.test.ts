import { readdirSync, readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import type { Actor, Role } from '@/lib/services/actor';
import { NotAllowed, NotFound } from '@/lib/services/service-error';
import { type Filled, fillRecord } from './fill-record';
import { makeOffice, type Office } from './office-factory';
import { verbs } from './verbs';

let filled: Filled;
let foreign: Office;
beforeAll(async () => {
  filled = await fillRecord();
  foreign = await makeOffice();
}, 60_000);
afterAll(() => database().destroy());

const roles: Role[] = ['administrator', 'engineer', 'checker', 'engineer-of-record'];

/** A person of an office with exactly one role. */
function actorWith(office: Office, role: Role): Actor {
  return { ...office.people.engineer, roles: [role] };
}

/** Everything that the record of an office holds, in figures: what a refused verb must leave as it was. */
async function countRows(officeId: string): Promise<number[]> {
  const tables = ['audit', 'jobs', 'sheets', 'drafts', 'revisions', 'checks', 'marks', 'submittals', 'mails'];
  return Promise.all(
    tables.map(async (t) =>
      Number((await database()(t).where({ office_id: officeId }).count({ n: '*' }).first())?.n),
    ),
  );
}

const refused = verbs.flatMap((verb) =>
  roles.filter((r) => !verb.roles.includes(r)).map((role) => [verb.name, role, verb] as const),
);

describe('a role that a verb is not for', () => {
  it.each(refused)('%s refuses %s', async (_name, role, verb) => {
    const before = await countRows(filled.office.id);
    await expect(verb.call(actorWith(filled.office, role), filled)).rejects.toBeInstanceOf(NotAllowed);
    expect(await countRows(filled.office.id)).toEqual(before);
  });
});

const onThings = verbs.filter((v) => v.thing).map((v) => [v.name, v] as const);

describe('another office', () => {
  it.each(onThings)('is told by %s that there is no such thing', async (_name, verb) => {
    const before = await countRows(filled.office.id);
    for (const role of verb.roles) {
      const stranger = {
        ...actorWith(foreign, role),
        roles: [role, ...(verb.roles[0] ? [verb.roles[0]] : [])],
      };
      await expect(verb.call(stranger, filled)).rejects.toBeInstanceOf(NotFound);
    }
    expect(await countRows(filled.office.id)).toEqual(before);
  });

  it.each(verbs.filter((v) => !v.thing && v.reads).map((v) => [v.name, v] as const))(
    'sees nothing of this one in %s',
    async (_name, verb) => {
      const seen = JSON.stringify(await verb.call({ ...foreign.people.engineer, roles }, filled));
      for (const id of [filled.jobId, filled.frozen.sheetId, filled.sent.submittalId, filled.office.id])
        expect(seen).not.toContain(id);
    },
  );
});

describe('the list of verbs', () => {
  it('holds every function of the services that takes an actor', () => {
    const declared = (readdirSync('lib/services', { recursive: true }) as string[])
      .filter((name) => name.endsWith('.ts') && !name.startsWith('demo/'))
      .flatMap((name) => {
        const text = readFileSync(`lib/services/${name}`, 'utf8');
        return [...text.matchAll(/^export async function (\w+)\(\s*actor: Actor/gm)].map((m) => m[1]);
      });
    expect(declared.length).toBeGreaterThan(30);
    expect(verbs.map((v) => v.name).toSorted()).toEqual(declared.toSorted());
  });

  it('names a role for every one', () => {
    for (const verb of verbs) expect(verb.roles.length, verb.name).toBeGreaterThan(0);
  });
});
