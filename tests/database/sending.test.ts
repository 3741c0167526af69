import { createHash } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { afterAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { database } from '@/db/connection';

const settings = vi.hoisted(() => ({ smtpUrl: '' }));
vi.mock('@/lib/env', async (original) => {
  const real = await original<typeof import('@/lib/env')>();
  return { ...real, env: () => ({ ...real.env(), smtpUrl: settings.smtpUrl }) };
});

import { commentOnReview } from '@/lib/services/comment-on-review';
import { concludeCheck } from '@/lib/services/conclude-check';
import { decideReview } from '@/lib/services/decide-review';
import { deliverMail } from '@/lib/services/deliver-mail';
import { freezeSheet } from '@/lib/services/freeze-sheet';
import { keepAuthority } from '@/lib/services/keep-authority';
import { keepDraft } from '@/lib/services/keep-draft';
import { openReview, reviewDoor } from '@/lib/services/open-review';
import { openSubmittal } from '@/lib/services/open-submittal';
import { readSubmittalFile } from '@/lib/services/read-file';
import { resendLetter } from '@/lib/services/resend-letter';
import { revokeReview } from '@/lib/services/revoke-review';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { sendToCheck } from '@/lib/services/send-to-check';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet, proppedDraft } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
});

const to = (submittalId: string, more: object = {}) => ({
  submittalId,
  reviewer: 'R. Viewer',
  email: 'reviewer@authority.example',
  days: '30',
  ...more,
});

async function sealed(revisionIds: string[]): Promise<string> {
  const submittalId = await draftedSubmittal(office, jobId, revisionIds);
  await sealSubmittal(office, submittalId);
  return submittalId;
}

const authority = (more: object) =>
  keepAuthority(office.people.administrator, {
    authorityId: office.authorityId,
    name: 'Invented Authority',
    decisions: ['Approved', 'Revise and Resubmit'],
    ...more,
  });

/** Freezes the sheet again with another title and has the new revision checked. */
async function nextRevision(sheetId: string): Promise<string> {
  const { engineer, checker } = office.people;
  const kept = await keepDraft(engineer, {
    sheetId,
    version: 1,
    draft: proppedDraft('Propped beam, longer'),
  });
  expect(kept.ok).toBe(true);
  const { revisionId } = need(await freezeSheet(engineer, { sheetId, reason: 'As commented.' }));
  const asked = { revisionId, checkerId: checker.personId, category: 1 };
  const { checkId } = need(await sendToCheck(engineer, asked));
  need(await concludeCheck(checker, { checkId, outcome: 'agreed', note: '' }));
  return revisionId;
}

describe('sending a submittal', () => {
  it('waits until every line of the authority’s own list is ticked off, and keeps them', async () => {
    need(await authority({ checklist: ['Cover signed', 'Index complete'] }));
    const submittalId = await sealed([(await checkedSheet(office, jobId)).revisionId]);
    const { engineer } = office.people;
    const half = await sendSubmittal(engineer, to(submittalId, { seenTo: ['Cover signed'] }));
    expect(half).toMatchObject({ ok: false, errors: [{ code: 'not-seen-to', path: 'seenTo' }] });
    expect(!half.ok && half.errors[0]?.message).toContain('Index complete');
    expect((await openSubmittal(engineer, submittalId)).transmittals).toEqual([]);
    const seenTo = ['Index complete', 'Cover signed'];
    need(await sendSubmittal(engineer, to(submittalId, { seenTo, action: 'Review for permit.' })));
    expect((await openSubmittal(engineer, submittalId)).transmittals).toMatchObject([
      { action: 'Review for permit.', seen_to: ['Cover signed', 'Index complete'] },
    ]);
  });

  it('says why it is blocked while a comment of an earlier round waits', async () => {
    const { sheetId, revisionId } = await checkedSheet(office, jobId);
    const first = await sealed([revisionId]);
    const link = await reviewLinkOf(await sendTo(office, first));
    need(await commentOnReview(link, { revisionId, line: '2.1', text: 'Name the drawing.', code: '' }));
    need(await decideReview(link, { words: 'Revise and Resubmit' }));
    const second = await sealed([await nextRevision(sheetId)]);
    const { engineer } = office.people;
    const why = 'Comment 1 on submittal 1 is not answered yet. Answer first, then send.';
    expect((await openSubmittal(engineer, second)).blocked).toBe(why);
    expect(await sendSubmittal(engineer, to(second))).toMatchObject({
      ok: false,
      errors: [{ code: 'comments-open', message: why }],
    });
  });

  it('flags what is new, changed or left out since the last one that was sent', async () => {
    const one = await checkedSheet(office, jobId);
    const two = await checkedSheet(office, jobId);
    const three = await checkedSheet(office, jobId);
    await sendTo(office, await sealed([one.revisionId, two.revisionId, three.revisionId]));
    const four = await checkedSheet(office, jobId);
    const changed = await nextRevision(one.sheetId);
    const second = await sealed([changed, two.revisionId, four.revisionId]);
    const { sheets, leftOut } = await openSubmittal(office.people.engineer, second);
    expect(sheets.map((s) => s.change)).toEqual(['changed since submittal 1', '', 'new since submittal 1']);
    expect(leftOut).toEqual(['S-03 Propped beam']);
    const { sheets: seen } = await openReview(await reviewLinkOf(await sendTo(office, second)));
    expect(seen.map((s) => s.change)).toEqual(sheets.map((s) => s.change));
    const [row] = await database()('transmittals').where({ submittal_id: second });
    expect(row.contents.split('\n')).toEqual([
      'S-01 Propped beam, longer, revision 1 (changed since submittal 1)',
      'S-02 Propped beam, revision 0',
      'S-04 Propped beam, revision 0 (new since submittal 1)',
      'left out since submittal 1: S-03 Propped beam, revision 0',
    ]);
  });
});

describe('a link', () => {
  it('of one reviewer is revoked alone', async () => {
    const submittalId = await sealed([(await checkedSheet(office, jobId)).revisionId]);
    const tokens = [await sendTo(office, submittalId), await sendTo(office, submittalId)];
    const { engineer } = office.people;
    const opened = await Promise.all(tokens.map((t) => reviewDoor(t, 'test-revoke')));
    expect(opened.every((d) => d.open)).toBe(true);
    const linkId = createHash('sha256')
      .update(tokens[0] as string)
      .digest('hex');
    expect(need(await revokeReview(engineer, { submittalId, linkId }))).toEqual({ links: 1 });
    const doors = await Promise.all(tokens.map((t) => reviewDoor(t, 'test-revoke')));
    expect(doors.map((d) => d.open)).toEqual([false, true]);
  });
});

/** A mail server that keeps what it is given. */
async function mailServer(): Promise<{ letters: Buffer[]; close: () => Promise<void> }> {
  const letters: Buffer[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, _session, callback) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        letters.push(Buffer.concat(parts));
        callback();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  settings.smtpUrl = `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`;
  return { letters, close: () => new Promise((resolve) => server.close(() => resolve())) };
}

describe('the letter', () => {
  it('carries the sealed file, byte for byte, when the authority wishes so', async () => {
    need(await authority({ wish: 'attachment' }));
    const submittalId = await sealed([(await checkedSheet(office, jobId)).revisionId]);
    await database()('mails').delete();
    await sendTo(office, submittalId);
    const { letters, close } = await mailServer();
    while (await deliverMail());
    await close();
    const letter = await simpleParser(letters[0] as Buffer);
    expect(letter.text).toContain('The sealed package is attached.');
    const file = await readSubmittalFile(office.people.engineer, submittalId);
    expect(letter.attachments).toMatchObject([
      { filename: 'submittal-1.pdf', contentType: 'application/pdf' },
    ]);
    expect(letter.attachments[0]?.content.equals(file)).toBe(true);
  });

  it('that was refused goes out again once, and not when its link is over', async () => {
    const submittalId = await sealed([(await checkedSheet(office, jobId)).revisionId]);
    await database()('mails').delete();
    await sendTo(office, submittalId);
    const { engineer } = office.people;
    const [mail] = (await openSubmittal(engineer, submittalId)).mails;
    const mailId = mail?.id as string;
    expect(await resendLetter(engineer, { mailId })).toMatchObject({ errors: [{ code: 'not-refused' }] });
    const refused = { state: 'refused', server_words: '550 no such mailbox', attempts: 4 };
    await database()('mails').where({ id: mailId }).update(refused);
    const both = await Promise.all([resendLetter(engineer, { mailId }), resendLetter(engineer, { mailId })]);
    expect(both.filter((b) => b.ok)).toHaveLength(1);
    const { letters, close } = await mailServer();
    while (await deliverMail());
    await close();
    expect(letters).toHaveLength(1);
    expect((await simpleParser(letters[0] as Buffer)).attachments).toEqual([]);
    await database()('mails').where({ id: mailId }).update(refused);
    need(await revokeReview(engineer, { submittalId }));
    expect(await resendLetter(engineer, { mailId })).toMatchObject({ errors: [{ code: 'link-over' }] });
  });
});
