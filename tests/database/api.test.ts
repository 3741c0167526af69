import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { POST } from '@/app/api/v1/analyses/route';
import { GET } from '@/app/api/v1/analyses/schema/route';
import { database } from '@/db/connection';
import type { AnalysisInput } from '@/lib/model/analysis';
import { issueApiToken } from '@/lib/services/issue-api-token';
import { revokeApiToken } from '@/lib/services/revoke-api-token';
import { tokenHash } from '@/lib/services/token';
import { makeOffice, need, type Office } from './office-factory';

vi.mock('@/app/session', () => ({ currentActor: async () => undefined }));

let office: Office;
let token: string;
beforeAll(async () => {
  office = await makeOffice();
  token = need(await issueApiToken(office.people.engineer, { name: 'nightly check', days: 7 })).token;
});
afterAll(() => database().destroy());

/** A beam fixed at one end and propped at the other, 8 m, under 10 kN/m. */
const propped: AnalysisInput = {
  form: 'fairhand.analysis/1',
  units: 'SI',
  basis: { kind: 'relative' },
  joints: [
    { id: '1', x: 0, y: 0, support: { x: 'held', y: 'held', turn: 'held' } },
    { id: '2', x: 8, y: 0, support: { x: 'free', y: 'held', turn: 'free' } },
  ],
  members: [{ id: '1-2', start: '1', end: '2', EI: 1 }],
  cases: [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      loads: [{ kind: 'distributed', member: '1-2', direction: 'y', w1: -10, w2: -10 }],
    },
  ],
};

async function post(body: unknown, bearer = token, query = '') {
  const answer = await POST(
    new Request(`http://fairhand.example/api/v1/analyses${query}`, {
      method: 'POST',
      headers: { authorization: `Bearer ${bearer}` },
      body: typeof body === 'string' ? body : JSON.stringify(body),
    }),
  );
  return { status: answer.status, type: answer.headers.get('content-type'), json: await answer.json() };
}

describe('a program with a token', () => {
  it('gets results and written steps', async () => {
    const { status, json } = await post(propped);
    expect(status).toBe(200);
    // 3wL/8 at the prop and wL²/8 at the wall (AISC Manual, beam table, fixed at one end and supported at the other; from memory).
    const value = (joint: string, component: string) =>
      json.cases.D.reactions.find(
        (r: { quantity: { joint: string; component: string } }) =>
          r.quantity.joint === joint && r.quantity.component === component,
      ).value;
    expect(value('2', 'y')).toBeCloseTo((3 * 10 * 8) / 8, 9);
    expect(value('1', 'turn')).toBeCloseTo((10 * 8 * 8) / 8, 9);
    expect(json.steps.length).toBeGreaterThan(40);
    expect(JSON.stringify(json.steps)).toContain('$');
    expect(json.steps.some((b: { kind: string }) => b.kind === 'figure')).toBe(false);
  });

  it('gets the drawings when it asks for them', async () => {
    const { json } = await post(propped, token, '?figures=yes');
    expect(json.steps.some((b: { kind: string }) => b.kind === 'figure')).toBe(true);
  });

  it('is told with a code and a place why a structure is not solved', async () => {
    const rollers = propped.joints.map((j) => ({
      ...j,
      support: { x: 'free', y: 'held', turn: 'free' },
    }));
    const { status, type, json } = await post({ ...propped, joints: rollers });
    expect(status).toBe(422);
    expect(type).toBe('application/problem+json');
    expect(json.code).toBe('unstable-parallel');
    expect(json.detail.length).toBeGreaterThan(20);
    const wrong = await post({ ...propped, members: [{ id: '1-2', start: '1', end: '9', EI: 1 }] });
    expect(wrong.status).toBe(422);
    expect(wrong.json.place.path).toMatch(/^members\.0/);
  });

  it('is told what is wrong with what it sent, and never that something failed', async () => {
    expect((await post('{')).status).toBe(400);
    expect((await post(' '.repeat(5_000_000))).status).toBe(413);
    await fc.assert(
      fc.asyncProperty(fc.jsonValue(), async (value) => {
        const { status, json } = await post(JSON.stringify(value));
        expect(status).toBe(422);
        expect(json.code).toBe('form');
      }),
      { numRuns: 60 },
    );
  });
});

describe('a program without a good token', () => {
  it('is not let in', async () => {
    for (const bearer of ['no-such-token-anywhere', 'short']) {
      const { status, json } = await post(propped, bearer);
      expect([status, json.code]).toEqual([401, 'not-signed-in']);
    }
    const bare = await POST(
      new Request('http://fairhand.example/api/v1/analyses', {
        method: 'POST',
        headers: { 'sec-fetch-site': 'cross-site' },
        body: JSON.stringify(propped),
      }),
    );
    expect(bare.status).toBe(401);
  });

  it('is not let in with one that was revoked', async () => {
    const { engineer } = office.people;
    const other = need(await issueApiToken(engineer, { name: 'old', days: 7 })).token;
    expect((await post(propped, other)).status).toBe(200);
    need(await revokeApiToken(engineer, { id: tokenHash(other) }));
    expect((await post(propped, other)).status).toBe(401);
  });

  it('is told that its holder is no longer an engineer', async () => {
    const { engineerOfRecord } = office.people;
    const held = need(await issueApiToken(engineerOfRecord, { name: 'held', days: 7 })).token;
    await database()('people')
      .where({ id: engineerOfRecord.personId })
      .update({ roles: JSON.stringify(['checker']) });
    const { status, json } = await post(propped, held);
    expect([status, json.code]).toEqual([403, 'not-allowed']);
  });
});

describe('the published form', () => {
  it('is a JSON schema that names its version and its units', async () => {
    const answer = GET();
    const schema = await answer.json();
    expect(answer.headers.get('content-type')).toContain('schema+json');
    expect(schema.title).toBe('fairhand.analysis/1');
    expect(schema.description).toContain('kN, m');
    expect(Object.keys(schema.properties)).toEqual(expect.arrayContaining(['joints', 'members', 'cases']));
  });
});
