// server only
import { randomBytes } from 'node:crypto';
import { insertRecoveryCodes, putSecondFactor, secondFactorOf } from '@/db/queries/second-factors';
import type { Actor } from '../actor';
import { inTransaction } from '../in-transaction';
import { everyone, requireRole } from '../require-role';
import type { Result } from '../result';
import { refuse } from '../service-error';
import { toBase32 } from './base32';
import { newRecoveryCodes, recoveryHash } from './recovery-code';

/**
 * A new secret for the person's device, 160 bits (RFC 4226, section 4, R6), and recovery codes, both shown this once. They
 * count only after a code of the device confirms them.
 */
export async function beginSecondFactor(
  actor: Actor,
): Promise<Result<{ secret: string; address: string; codes: string[] }>> {
  requireRole(actor, ...everyone);
  const { officeId, personId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const factor = await secondFactorOf(trx, officeId, personId, true);
    if (factor?.confirmed_at) refuse('second-factor-on', '', 'Your second factor is on already.');
    const secret = toBase32(randomBytes(20));
    await putSecondFactor(trx, {
      person_id: personId,
      office_id: officeId,
      secret,
      confirmed_at: null,
      last_step: 0,
    });
    const codes = newRecoveryCodes();
    await insertRecoveryCodes(trx, officeId, personId, codes.map(recoveryHash));
    await record('began a second factor', actor.name, { aboutId: personId });
    const label = encodeURIComponent(`Fairhand:${actor.email}`);
    return { secret, address: `otpauth://totp/${label}?secret=${secret}&issuer=Fairhand`, codes };
  });
}
