'use server';

import { sayBreak } from '@/lib/services/say-break';
import { verifyAudit } from '@/lib/services/verify-audit';
import { orRefuse, requireActor } from '../session';
import { afterRefusal, type FormState } from './form-state';

export async function verifyRecord(): Promise<FormState> {
  const actor = await requireActor();
  const walked = await orRefuse(verifyAudit(actor));
  if (!walked.ok) return afterRefusal(walked, new FormData());
  const { entries, broken } = walked.value;
  if (broken === undefined) {
    const all = entries === 1 ? 'The one entry' : `All ${entries} entries`;
    return {
      errors: [],
      typed: {},
      done: `${all} of the office’s record follow from one another to the end.`,
    };
  }
  return { errors: [{ path: '', message: sayBreak(broken, entries) }], typed: {} };
}
