import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import type { Actor } from '@/lib/services/actor';
import { changeOffice } from '@/lib/services/change-office';
import { completeSeal } from '@/lib/services/complete-seal';
import { prepareSeal } from '@/lib/services/prepare-seal';
import { answerSecondStep } from '@/lib/services/second-factor/answer-second-step';
import { fromBase32 } from '@/lib/services/second-factor/base32';
import { beginSecondFactor } from '@/lib/services/second-factor/begin-second-factor';
import { clearSecondFactor } from '@/lib/services/second-factor/clear-second-factor';
import { confirmSecondFactor } from '@/lib/services/second-factor/confirm-second-factor';
import { dropSecondFactor } from '@/lib/services/second-factor/drop-second-factor';
import { codeForCounter, timeStep } from '@/lib/services/second-factor/one-time-code';
import { readSecondFactor } from '@/lib/services/second-factor/read-second-factor';
import { readSession } from '@/lib/services/session';
import { signIn } from '@/lib/services/sign-in';
import { makeJob, makeOffice, need, type Office, password } from './office-factory';
import { checkedSheet } from './sheet-factory';
import { draftedSubmittal, signPrepared } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
beforeEach(async () => {
  office = await makeOffice();
});

const from = () => `test-${Math.random()}`;
const codeNow = (secret: string) => codeForCounter(fromBase32(secret), timeStep(new Date()));

/** Turns the second factor on, and forgets which code did, so that the next one may be of the same half minute. */
async function turnOn(actor: Actor) {
  const { secret, codes } = need(await beginSecondFactor(actor));
  const { token } = need(await signIn({ email: actor.email, password }, from()));
  need(await confirmSecondFactor(actor, { code: codeNow(secret) }, token));
  await forgetStep(actor);
  return { secret, codes, token };
}

const forgetStep = (actor: Actor) =>
  database()('second_factors').where({ person_id: actor.personId }).update({ last_step: 0 });

const firstStep = async (actor: Actor) => need(await signIn({ email: actor.email, password }, from()));

describe('the second factor', () => {
  it('is on only after a first right code; every session that gave none ends', async () => {
    const { engineer } = office.people;
    const before = await firstStep(engineer);
    expect(before.step).toBe('in');
    const { secret, codes } = need(await beginSecondFactor(engineer));
    expect((await firstStep(engineer)).step).toBe('in');
    expect((await dropSecondFactor(engineer, { code: codes[0] })).ok).toBe(false);
    const wrong = String((Number(codeNow(secret)) + 1) % 1_000_000).padStart(6, '0');
    expect(await confirmSecondFactor(engineer, { code: wrong }, '')).toMatchObject({
      errors: [{ code: 'wrong-code', path: 'code' }],
    });
    expect(await confirmSecondFactor(engineer, { code: '12' }, '')).toMatchObject({ ok: false });
    const own = await firstStep(engineer);
    need(await confirmSecondFactor(engineer, { code: codeNow(secret) }, own.token));
    expect(await readSession(before.token)).toBeUndefined();
    expect((await readSession(own.token))?.personId).toBe(engineer.personId);
    expect(await beginSecondFactor(engineer)).toMatchObject({ errors: [{ code: 'second-factor-on' }] });
  });

  it('stands between the password and a session, and takes each code once', async () => {
    const { engineer } = office.people;
    const { secret } = await turnOn(engineer);
    const { step, token } = await firstStep(engineer);
    expect(step).toBe('code');
    expect(await readSession(token)).toBeUndefined();
    const code = codeNow(secret);
    const { token: session } = need(await answerSecondStep({ token, code }, from()));
    expect((await readSession(session))?.personId).toBe(engineer.personId);
    const again = await firstStep(engineer);
    expect(await answerSecondStep({ token: again.token, code }, from())).toMatchObject({
      errors: [{ code: 'wrong-code' }],
    });
    await forgetStep(engineer);
    expect(await answerSecondStep({ token, code }, from())).toMatchObject({
      errors: [{ code: 'step-over' }],
    });
  });

  it('takes a recovery code in place of the device, once, also when two come at the same instant', async () => {
    const { engineer } = office.people;
    const { codes } = await turnOn(engineer);
    const [code] = codes as [string];
    expect(JSON.stringify(await database()('recovery_codes').select())).not.toContain(code);
    const steps = [await firstStep(engineer), await firstStep(engineer)];
    const both = await Promise.all(steps.map(({ token }) => answerSecondStep({ token, code }, from())));
    expect(both.filter((b) => b.ok)).toHaveLength(1);
    expect((await readSecondFactor(engineer)).codesLeft).toBe(9);
  });

  it('is not guessed: after eight wrong codes the right one waits too', async () => {
    const { engineer } = office.people;
    const { secret } = await turnOn(engineer);
    const { token } = await firstStep(engineer);
    const wrong = String((Number(codeNow(secret)) + 7) % 1_000_000).padStart(6, '0');
    for (let i = 0; i < 8; i++) await answerSecondStep({ token, code: wrong }, from());
    expect(await answerSecondStep({ token, code: codeNow(secret) }, from())).toMatchObject({
      errors: [{ code: 'too-often' }],
    });
  });

  it('is waited for five minutes', async () => {
    const { engineer } = office.people;
    const { secret } = await turnOn(engineer);
    const { token } = await firstStep(engineer);
    await database()('one_time_tokens')
      .where({ person_id: engineer.personId })
      .update({ expires_at: new Date(Date.now() - 1000) });
    expect(await answerSecondStep({ token, code: codeNow(secret) }, from())).toMatchObject({
      errors: [{ code: 'step-over' }],
    });
  });

  it('is turned off with a code, or by the administrator for who lost everything', async () => {
    const { engineer, checker, administrator } = office.people;
    const { secret } = await turnOn(engineer);
    expect((await dropSecondFactor(engineer, { code: 'aaaa-bbbb-cccc-dddd' })).ok).toBe(false);
    need(await dropSecondFactor(engineer, { code: codeNow(secret) }));
    expect((await firstStep(engineer)).step).toBe('in');
    const { token } = await turnOn(checker);
    need(await clearSecondFactor(administrator, { personId: checker.personId }));
    expect(await readSession(token)).toBeUndefined();
    expect((await firstStep(checker)).step).toBe('in');
  });
});

describe('an office that asks for it before sealing', () => {
  it('lets nothing be prepared without it, nor completed when it was asked for meanwhile', async () => {
    const { administrator, engineerOfRecord } = office.people;
    const jobId = await makeJob(office);
    const { revisionId } = await checkedSheet(office, jobId);
    const submittalId = await draftedSubmittal(office, jobId, [revisionId]);
    const early = need(await prepareSeal(engineerOfRecord, { submittalId }));
    const cms = await signPrepared(engineerOfRecord, early);
    need(await changeOffice(administrator, { lateAfter: 10, sealNeedsSecond: true }));
    const refused = { ok: false, errors: [{ code: 'second-factor-needed' }] };
    expect(await prepareSeal(engineerOfRecord, { submittalId })).toMatchObject(refused);
    const { preparedId } = early;
    expect(await completeSeal(engineerOfRecord, { preparedId, cms })).toMatchObject(refused);
    await turnOn(engineerOfRecord);
    need(await completeSeal(engineerOfRecord, { preparedId, cms }));
  });
});
