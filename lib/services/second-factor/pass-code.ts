// server only
import type { Knex } from 'knex';
import { putSecondFactor, secondFactorOf, takeRecoveryCode } from '@/db/queries/second-factors';
import { fromBase32 } from './base32';
import { stepOfCode } from './one-time-code';
import { recoveryHash } from './recovery-code';

/** Takes a code of the person's device, or one of the recovery codes; each is taken once. Answers which it was. */
export async function passCode(
  trx: Knex.Transaction,
  officeId: string,
  personId: string,
  code: string,
  at: Date,
): Promise<'device' | 'recovery' | undefined> {
  const factor = await secondFactorOf(trx, officeId, personId, true);
  if (!factor) return undefined;
  const figures = code.replace(/\s/g, '');
  if (/^\d{6}$/.test(figures)) {
    const step = stepOfCode(fromBase32(factor.secret), figures, at, factor.last_step);
    if (step === undefined) return undefined;
    await putSecondFactor(trx, { ...factor, last_step: step });
    return 'device';
  }
  const known =
    factor.confirmed_at && (await takeRecoveryCode(trx, officeId, personId, recoveryHash(code), at));
  return known ? 'recovery' : undefined;
}

export const wrongCode =
  'This code is not right, or was used already. Wait for the next one on your device, and see that its clock is right.';
