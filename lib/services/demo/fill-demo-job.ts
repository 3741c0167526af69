// server only
import type { Draft } from '@/lib/model/draft';
import type { Actor } from '../actor';
import { concludeCheck } from '../conclude-check';
import { addSheet } from '../create-sheet';
import { freezeSheet } from '../freeze-sheet';
import { actorById } from '../read-actor';
import type { Result } from '../result';
import { sendToCheck } from '../send-to-check';
import { pinnedPortal, threeSpanBeam, twoStoreyFrame } from './demo-sheets';

/** Fills the demo job by the same verbs a person uses: one sheet checked, one frozen, one still a draft. */
export async function fillDemoJob(
  officeId: string,
  jobId: string,
  people: { engineer: string; checker: string },
): Promise<void> {
  const engineer = await actorOf(people.engineer);
  const checker = await actorOf(people.checker);
  if (engineer.officeId !== officeId) throw new Error('the engineer belongs to another office');
  const add = (draft: Draft) => addSheet(engineer, jobId, draft.title, draft, 'made sheet');

  const beam = await add(threeSpanBeam());
  const beamRevision = need(
    await freezeSheet(engineer, { sheetId: beam, reason: 'First issue, for checking.' }),
  );
  const check = need(
    await sendToCheck(engineer, {
      revisionId: beamRevision.revisionId,
      checkerId: checker.personId,
      category: 1,
    }),
  );
  need(
    await concludeCheck(checker, {
      checkId: check.checkId,
      outcome: 'agreed',
      note: 'Reworked by hand; agrees.',
    }),
  );

  const portal = await add(pinnedPortal());
  need(await freezeSheet(engineer, { sheetId: portal, reason: 'First issue, for checking.' }));

  await add(twoStoreyFrame());
}

async function actorOf(personId: string): Promise<Actor> {
  const actor = await actorById(personId);
  if (!actor) throw new Error(`no person ${personId}`);
  return actor;
}

function need<T>(result: Result<T>): T {
  if (!result.ok)
    throw new Error(`the demo could not be filled: ${result.errors.map((e) => e.message).join(' ')}`);
  return result.value;
}
