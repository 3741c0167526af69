// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import {
  checkById,
  insertMark,
  insertMarkStep,
  marksOf,
  removeMark,
  unsettledBefore,
} from '@/db/queries/checks';
import { revisionById } from '@/db/queries/revisions';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { markPlace } from './mark-state';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotAllowed, NotFound, refuse } from './service-error';

const input = z.object({
  checkId: z.string().max(36),
  markId: z.string().max(36),
  outcome: z.enum(['verified', 'carried']),
});

/**
 * What a checker finds of a mark that an earlier revision left open: the correction was made (verified), or it was not, and
 * the mark is carried on into this check, where it must be answered like any other.
 */
export async function verifyCorrection(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'checker');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { checkId, markId, outcome } = parsed.data;
  const { officeId, personId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const check = await checkById(trx, officeId, checkId, true);
    const r = check && (await revisionById(trx, officeId, check.revision_id));
    if (!check || !r) throw new NotFound(`check ${checkId}`);
    if (check.checker_id !== personId) throw new NotAllowed('only its checker verifies a correction');
    if (check.state === 'void') refuse('check-void', '', 'The sheet changed meanwhile: this check is void.');
    if (check.state !== 'open') refuse('check-closed', '', 'This check is closed.');
    const mark = (await unsettledBefore(trx, officeId, r.sheet_id, r.number)).find((m) => m.id === markId);
    if (!mark) throw new NotFound(`open mark ${markId}`);
    const at = new Date();
    if (outcome === 'carried') {
      const there = (await marksOf(trx, officeId, checkId)).find(
        (m) => m.place === mark.place && m.line === mark.line && m.kind !== 'agrees',
      );
      if (!there) {
        const place = { check_id: checkId, place: mark.place, line: mark.line };
        await removeMark(trx, officeId, place);
        const { kind, text } = mark;
        await insertMark(trx, {
          id: randomUUID(),
          office_id: officeId,
          ...place,
          kind,
          text,
          drawing: '',
          at,
        });
      }
    }
    const step = { office_id: officeId, mark_id: markId, kind: outcome, text: '', person_id: personId };
    await insertMarkStep(trx, { ...step, check_id: checkId, at });
    const verb = outcome === 'verified' ? 'verified a correction' : 'carried a mark on';
    const about = { digest: r.digest, jobId: r.job_id, aboutId: r.sheet_id };
    await record(verb, `${markPlace(mark)} of revision ${mark.revision}`.slice(0, 400), about);
    return null;
  });
}
