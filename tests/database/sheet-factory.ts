import type { Draft } from '@/lib/model/draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';
import { concludeCheck } from '@/lib/services/conclude-check';
import { addSheet } from '@/lib/services/create-sheet';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { sendToCheck } from '@/lib/services/send-to-check';
import { need, type Office } from './office-factory';

/** A propped cantilever that solves. */
export function proppedDraft(title = 'Propped beam'): Draft {
  const draft = startingDraft('beam', 'SI', title);
  draft.geometry = {
    shape: 'beam',
    spans: [{ length: '6 m', stiffness: blankStiffness() }],
    supports: [blankSupport('fixed'), blankSupport('roller')],
  };
  draft.cases[0]?.loads.push({
    kind: 'uniform',
    on: '1-2',
    direction: 'down',
    per: 'length',
    first: '12 kN/m',
    second: '',
    from: '',
    to: '',
    source: '',
  });
  return draft;
}

export async function makeSheet(office: Office, jobId: string): Promise<string> {
  const draft = proppedDraft();
  return addSheet(office.people.engineer, jobId, draft.title, draft, 'made sheet');
}

export async function frozenSheet(
  office: Office,
  jobId: string,
): Promise<{ sheetId: string; revisionId: string }> {
  const sheetId = await makeSheet(office, jobId);
  const { revisionId } = need(
    await freezeSheet(office.people.engineer, { sheetId, reason: 'For checking.' }),
  );
  return { sheetId, revisionId };
}

export async function checkedSheet(
  office: Office,
  jobId: string,
): Promise<{ sheetId: string; revisionId: string; checkId: string }> {
  const { sheetId, revisionId } = await frozenSheet(office, jobId);
  const { checker, engineer } = office.people;
  const { checkId } = need(
    await sendToCheck(engineer, { revisionId, checkerId: checker.personId, category: 1 }),
  );
  need(await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' }));
  return { sheetId, revisionId, checkId };
}
