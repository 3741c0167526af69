// server only
import type { Draft } from '@/lib/model/draft';
import { concludeCheck } from '../conclude-check';
import { addSheet } from '../create-sheet';
import { freezeSheet } from '../freeze-sheet';
import { sendToCheck } from '../send-to-check';
import { pinnedPortal, threeSpanBeam, twoStoreyFrame } from './demo-sheets';
import type { DemoPeople } from './fill-answered-job';
import { need } from './need';

/** Fills the demo job by the same verbs a person uses: one sheet checked, one frozen, one still a draft. */
export async function fillDemoJob(jobId: string, { engineer, checker }: DemoPeople): Promise<void> {
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
