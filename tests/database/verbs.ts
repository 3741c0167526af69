import type { Actor, Role } from '@/lib/services/actor';
import { addLicence } from '@/lib/services/add-licence';
import { answerComment } from '@/lib/services/answer-comment';
import { answerMark } from '@/lib/services/answer-mark';
import { beginOwnSheet } from '@/lib/services/begin-own-sheet';
import { changeOffice } from '@/lib/services/change-office';
import { changePassword } from '@/lib/services/change-password';
import { changePerson } from '@/lib/services/change-person';
import { compareOwnSheet } from '@/lib/services/compare-own-sheet';
import { compareRevisions } from '@/lib/services/compare-revisions';
import { completeSeal } from '@/lib/services/complete-seal';
import { concludeCheck } from '@/lib/services/conclude-check';
import { copySheet } from '@/lib/services/copy-sheet';
import { createJob } from '@/lib/services/create-job';
import { addSheet, createSheet } from '@/lib/services/create-sheet';
import { createSubmittal } from '@/lib/services/create-submittal';
import { exportJob } from '@/lib/services/export/export-job';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { invitePerson } from '@/lib/services/invite-person';
import { issueApiToken } from '@/lib/services/issue-api-token';
import { keepAuthority } from '@/lib/services/keep-authority';
import { keepDraft } from '@/lib/services/keep-draft';
import { listDraftVersions } from '@/lib/services/list-draft-versions';
import { listJobs } from '@/lib/services/list-jobs';
import { markLine } from '@/lib/services/mark-line';
import { myWork } from '@/lib/services/my-work';
import { nameJobPeople } from '@/lib/services/name-job-people';
import { openCheck } from '@/lib/services/open-check';
import { openComments } from '@/lib/services/open-comments';
import { openDraftVersion } from '@/lib/services/open-draft-version';
import { openJob } from '@/lib/services/open-job';
import { openOffice } from '@/lib/services/open-office';
import { openRevision } from '@/lib/services/open-revision';
import { openSheet } from '@/lib/services/open-sheet';
import { openSubmittal } from '@/lib/services/open-submittal';
import { prepareSeal } from '@/lib/services/prepare-seal';
import { printCertificate } from '@/lib/services/print-certificate';
import { printResponses } from '@/lib/services/print-responses';
import { listApiTokens } from '@/lib/services/read-api-token';
import { readAudit } from '@/lib/services/read-audit';
import { readPreparedFile, readSubmittalFile } from '@/lib/services/read-file';
import { resendLetter } from '@/lib/services/resend-letter';
import { restoreRevision } from '@/lib/services/restore-revision';
import { revokeApiToken } from '@/lib/services/revoke-api-token';
import { revokeReview } from '@/lib/services/revoke-review';
import { beginSecondFactor } from '@/lib/services/second-factor/begin-second-factor';
import { clearSecondFactor } from '@/lib/services/second-factor/clear-second-factor';
import { confirmSecondFactor } from '@/lib/services/second-factor/confirm-second-factor';
import { dropSecondFactor } from '@/lib/services/second-factor/drop-second-factor';
import { readSecondFactor } from '@/lib/services/second-factor/read-second-factor';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { sendToCheck } from '@/lib/services/send-to-check';
import { setJobState } from '@/lib/services/set-job-state';
import { settleMark } from '@/lib/services/settle-mark';
import { signOutEverywhere } from '@/lib/services/sign-out-everywhere';
import { solveAnalysis } from '@/lib/services/solve-analysis';
import { verifyAudit } from '@/lib/services/verify-audit';
import { verifyCorrection } from '@/lib/services/verify-correction';
import { verifyRevision } from '@/lib/services/verify-revision';
import { withdrawLicence } from '@/lib/services/withdraw-licence';
import type { Filled } from './fill-record';
import { proppedDraft } from './sheet-factory';

export interface Verb {
  name: string;
  /** Who may call it. */
  roles: Role[];
  /** Whether it is about something that exists already, which another office does not have. */
  thing: boolean;
  reads?: boolean;
  call: (actor: Actor, f: Filled) => Promise<unknown>;
}

const everyone: Role[] = ['administrator', 'engineer', 'checker', 'engineer-of-record'];
const makers: Role[] = ['engineer', 'engineer-of-record'];
const leaders: Role[] = ['administrator', ...makers];

/** A verb with the input of someone who knows the ids of the filled office. */
const on = (run: { name: string }, roles: Role[], call: Verb['call'], more: Partial<Verb> = {}): Verb => ({
  name: run.name,
  roles,
  thing: true,
  call,
  ...more,
});

const reads = { thing: false, reads: true };
const makes = { thing: false };

/** Every verb that a signed-in person calls, with who may. */
export const verbs: Verb[] = [
  on(addLicence, ['administrator'], (a, f) =>
    addLicence(a, {
      personId: f.office.people.engineerOfRecord.personId,
      jurisdiction: 'Orrin',
      profession: 'Structural Engineer',
      number: '1',
      expires: '2030-01-01',
    }),
  ),
  on(addSheet, makers, (a, f) => addSheet(a, f.jobId, 'T', proppedDraft(), 'made sheet')),
  on(answerComment, makers, (a, f) => answerComment(a, { commentId: f.sent.commentId, answer: 'x' })),
  on(beginOwnSheet, ['checker'], (a, f) => beginOwnSheet(a, { checkId: f.sent.checkId })),
  on(compareOwnSheet, ['checker'], (a, f) => compareOwnSheet(a, { checkId: f.sent.checkId })),
  on(answerMark, makers, (a, f) => answerMark(a, { markId: f.sent.markId, answer: 'x' })),
  on(changeOffice, ['administrator'], (a) => changeOffice(a, { lateAfter: 10 }), makes),
  on(beginSecondFactor, everyone, (a) => beginSecondFactor(a), makes),
  on(clearSecondFactor, ['administrator'], (a, f) =>
    clearSecondFactor(a, { personId: f.office.people.checker.personId }),
  ),
  on(confirmSecondFactor, everyone, (a) => confirmSecondFactor(a, { code: '000000' }, ''), makes),
  on(dropSecondFactor, everyone, (a) => dropSecondFactor(a, { code: '000000' }), makes),
  on(readSecondFactor, everyone, (a) => readSecondFactor(a), reads),
  on(
    changePassword,
    everyone,
    (a) => changePassword(a, { current: 'wrong', password: 'another long one' }),
    makes,
  ),
  on(changePerson, ['administrator'], (a, f) =>
    changePerson(a, {
      personId: f.office.people.checker.personId,
      name: 'New Name',
      initials: 'NN',
      roles: ['administrator'],
      active: true,
    }),
  ),
  on(compareRevisions, everyone, (a, f) => compareRevisions(a, { revisionId: f.sent.revisionId })),
  on(completeSeal, ['engineer-of-record'], (a) =>
    completeSeal(a, { preparedId: 'not-there', cms: new Uint8Array([1]) }),
  ),
  on(concludeCheck, ['checker'], (a, f) =>
    concludeCheck(a, { checkId: f.sent.checkId, outcome: 'agreed', note: '' }),
  ),
  on(copySheet, makers, (a, f) => copySheet(a, { sheetId: f.frozen.sheetId })),
  on(
    createJob,
    leaders,
    (a) =>
      createJob(a, {
        number: `J-${Math.random()}`,
        title: 'T',
        place: '',
        units: 'US',
        pageSize: 'Letter',
        jurisdiction: 'Orrin',
        codes: '',
      }),
    makes,
  ),
  on(createSheet, makers, (a, f) => createSheet(a, { jobId: f.jobId, start: 'beam', title: 'T' })),
  on(createSubmittal, makers, (a, f) =>
    createSubmittal(a, {
      jobId: f.jobId,
      purpose: 'for permit',
      remarks: '',
      revisionIds: [f.sent.revisionId],
    }),
  ),
  on(exportJob, leaders, (a, f) => exportJob(a, f.jobId)),
  on(freezeSheet, makers, (a, f) => freezeSheet(a, { sheetId: f.frozen.sheetId, reason: 'Try it.' })),
  on(
    invitePerson,
    ['administrator'],
    (a) =>
      invitePerson(a, { email: `${Math.random()}@x.example`, name: 'NN', initials: 'N', roles: ['checker'] }),
    makes,
  ),
  on(issueApiToken, makers, (a) => issueApiToken(a, { name: 'a program', days: 30 }), makes),
  on(keepAuthority, ['administrator'], (a, f) =>
    keepAuthority(a, { authorityId: f.office.authorityId, name: 'Another', decisions: ['Yes'] }),
  ),
  on(keepDraft, makers, (a, f) =>
    keepDraft(a, { sheetId: f.frozen.sheetId, version: 1, draft: proppedDraft() }),
  ),
  on(listApiTokens, makers, (a) => listApiTokens(a), reads),
  on(listDraftVersions, everyone, (a, f) => listDraftVersions(a, { sheetId: f.frozen.sheetId })),
  on(listJobs, everyone, (a) => listJobs(a, {}), reads),
  on(markLine, ['checker'], (a, f) =>
    markLine(a, { checkId: f.sent.checkId, line: '1', kind: 'agrees', text: '' }),
  ),
  on(myWork, everyone, (a) => myWork(a), reads),
  on(nameJobPeople, leaders, (a, f) => nameJobPeople(a, { jobId: f.jobId, part: 'checker', personIds: [] })),
  on(openCheck, everyone, (a, f) => openCheck(a, f.sent.checkId)),
  on(openComments, everyone, (a, f) => openComments(a, f.jobId)),
  on(openDraftVersion, everyone, (a, f) => openDraftVersion(a, { sheetId: f.frozen.sheetId, version: 1 })),
  on(openJob, everyone, (a, f) => openJob(a, f.jobId)),
  on(openOffice, everyone, (a) => openOffice(a), reads),
  on(openRevision, everyone, (a, f) => openRevision(a, f.sent.revisionId)),
  on(openSheet, everyone, (a, f) => openSheet(a, f.frozen.sheetId)),
  on(openSubmittal, everyone, (a, f) => openSubmittal(a, f.sent.submittalId)),
  on(prepareSeal, ['engineer-of-record'], (a, f) => prepareSeal(a, { submittalId: f.sent.submittalId })),
  on(printResponses, everyone, (a, f) => printResponses(a, f.jobId)),
  on(printCertificate, everyone, (a, f) => printCertificate(a, f.sent.checkId)),
  on(readAudit, everyone, (a, f) => readAudit(a, { jobId: f.jobId }), reads),
  on(readPreparedFile, ['engineer-of-record'], (a) => readPreparedFile(a, 'not-there')),
  on(readSubmittalFile, everyone, (a, f) => readSubmittalFile(a, f.sent.submittalId)),
  on(restoreRevision, makers, (a, f) => restoreRevision(a, { revisionId: f.sent.revisionId })),
  on(resendLetter, makers, (a, f) => resendLetter(a, { mailId: f.sent.mailId })),
  on(revokeApiToken, makers, (a) => revokeApiToken(a, { id: '0'.repeat(64) })),
  on(revokeReview, makers, (a, f) => revokeReview(a, { submittalId: f.sent.submittalId })),
  on(sendSubmittal, makers, (a, f) =>
    sendSubmittal(a, { submittalId: f.sent.submittalId, reviewer: 'RR', email: 'r@x.example', days: 3 }),
  ),
  on(sendToCheck, makers, (a, f) =>
    sendToCheck(a, {
      revisionId: f.frozen.revisionId,
      checkerId: f.office.people.checker.personId,
      category: 1,
    }),
  ),
  on(setJobState, leaders, (a, f) => setJobState(a, { jobId: f.jobId, state: 'closed' })),
  on(settleMark, ['checker'], (a, f) =>
    settleMark(a, { markId: f.sent.markId, outcome: 'reopened', text: 'x' }),
  ),
  on(signOutEverywhere, everyone, (a) => signOutEverywhere(a), makes),
  on(solveAnalysis, makers, (a) => solveAnalysis(a, {}, false), makes),
  on(verifyAudit, everyone, (a) => verifyAudit(a), reads),
  on(verifyRevision, everyone, (a, f) => verifyRevision(a, f.sent.revisionId)),
  on(verifyCorrection, ['checker'], (a, f) =>
    verifyCorrection(a, { checkId: f.sent.checkId, markId: f.sent.markId, outcome: 'verified' }),
  ),
  on(withdrawLicence, ['administrator'], (a) => withdrawLicence(a, { licenceId: 'not-there' })),
];
