import { afterAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import type { ReviewLinkRow } from '@/db/queries/reviews';
import { answerComment } from '@/lib/services/answer-comment';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { decideReview } from '@/lib/services/decide-review';
import { openReview, reviewDoor } from '@/lib/services/open-review';
import { openSubmittal } from '@/lib/services/open-submittal';
import { revokeReview } from '@/lib/services/revoke-review';
import { sendSubmittal } from '@/lib/services/send-submittal';
import { NotFound } from '@/lib/services/service-error';
import { settleComment } from '@/lib/services/settle-comment';
import { tokenHash } from '@/lib/services/token';
import { makeJob, makeOffice, need, type Office } from './office-factory';
import { checkedSheet } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo } from './submittal-factory';

afterAll(() => database().destroy());

let office: Office;
let jobId: string;
let revisionId: string;
let submittalId: string;
let token: string;
let link: ReviewLinkRow;
beforeEach(async () => {
  office = await makeOffice();
  jobId = await makeJob(office);
  ({ revisionId } = await checkedSheet(office, jobId));
  submittalId = await draftedSubmittal(office, jobId, [revisionId]);
  await sealSubmittal(office, submittalId);
  token = await sendTo(office, submittalId);
  link = await reviewLinkOf(token);
});

const from = () => `test-${Math.random()}`;
const comment = { line: '2.1', text: 'Name the drawing.', code: 'IBC 1603.1' };

async function commentId(): Promise<string> {
  need(await commentOnReview(link, { ...comment, revisionId }));
  const [first] = (await openSubmittal(office.people.engineer, submittalId)).comments;
  return first?.id as string;
}

async function stateOfComment(): Promise<string | undefined> {
  return (await openReview(link)).comments[0]?.state;
}

describe('a review link', () => {
  it('is kept as a hash', async () => {
    expect(link.id).toBe(tokenHash(token));
    expect(JSON.stringify(await database()('review_links').where({ office_id: office.id }))).not.toContain(
      token,
    );
  });

  it('says why it opens nothing: unknown, expired, revoked, tried too often', async () => {
    expect(await reviewDoor('no-such-token', from())).toEqual({ open: false, why: 'unknown' });
    await database()('review_links')
      .where({ id: link.id })
      .update({ expires_at: new Date(Date.now() - 1000) });
    expect(await reviewDoor(token, from())).toEqual({ open: false, why: 'expired' });
    need(await revokeReview(office.people.engineer, { submittalId }));
    expect(await reviewDoor(token, from())).toEqual({ open: false, why: 'revoked' });
    const crowd = from();
    const rows = Array.from({ length: 600 }, () => ({ subject: `review:${crowd}`, at: new Date() }));
    await database()('attempts').insert(rows);
    expect(await reviewDoor(token, crowd)).toEqual({ open: false, why: 'too-often' });
  });

  it('shows its own submittal and no other', async () => {
    const another = await checkedSheet(office, jobId);
    const read = await openReview(link);
    expect(read.sheets.map((s) => s.revisionId)).toEqual([revisionId]);
    const strange = await commentOnReview(link, { ...comment, revisionId: another.revisionId });
    expect(strange).toMatchObject({ ok: false, errors: [{ code: 'not-in-submittal' }] });
  });

  it('survives sending again; revoking closes all', async () => {
    const again = await sendTo(office, submittalId);
    expect((await reviewDoor(token, from())).open).toBe(true);
    const revoked = need(await revokeReview(office.people.engineer, { submittalId }));
    expect(revoked.links).toBe(2);
    expect((await reviewDoor(again, from())).open).toBe(false);
  });
});

describe('a decision', () => {
  it('is one of the words of the authority', async () => {
    expect(await decideReview(link, { words: 'Splendid' })).toMatchObject({
      ok: false,
      errors: [{ code: 'unknown-decision', path: 'words' }],
    });
    need(await decideReview(link, { words: 'Revise and Resubmit' }));
    expect((await openReview(link)).decision?.words).toBe('Revise and Resubmit');
  });

  it('closes the comments and is told to who gathered and who sealed', async () => {
    need(await decideReview(link, { words: 'Approved' }));
    expect(await commentOnReview(link, { ...comment, revisionId })).toMatchObject({
      ok: false,
      errors: [{ code: 'decided' }],
    });
    const told = await database()('mails')
      .where({ office_id: office.id })
      .where('subject', 'like', '%: Approved');
    const { engineer, engineerOfRecord } = office.people;
    expect(told.map((m) => m.recipient).toSorted()).toEqual(
      [engineer.email, engineerOfRecord.email].toSorted(),
    );
  });
});

describe('a comment', () => {
  it('goes from open to answered to accepted, and then stands', async () => {
    const id = await commentId();
    expect(await stateOfComment()).toBe('open');
    const accept = { commentId: id, outcome: 'accepted' };
    expect(await settleComment(link, accept)).toMatchObject({
      ok: false,
      errors: [{ code: 'not-answered' }],
    });
    need(await answerComment(office.people.engineer, { commentId: id, answer: 'A-201.', place: 'S-01.1' }));
    expect(await stateOfComment()).toBe('answered');
    need(await settleComment(link, accept));
    expect(await stateOfComment()).toBe('accepted');
    const late = await answerComment(office.people.engineer, { commentId: id, answer: 'More.' });
    expect(late).toMatchObject({ ok: false, errors: [{ code: 'comment-accepted' }] });
  });

  it('is opened again with what is still asked for, and keeps every answer', async () => {
    const id = await commentId();
    const { engineer } = office.people;
    need(await answerComment(engineer, { commentId: id, answer: 'First.' }));
    expect((await settleComment(link, { commentId: id, outcome: 'reopened' })).ok).toBe(false);
    need(await settleComment(link, { commentId: id, outcome: 'reopened', text: 'Which revision?' }));
    expect(await stateOfComment()).toBe('reopened');
    need(await answerComment(engineer, { commentId: id, answer: 'Second.' }));
    const said = await database()('responses').where({ comment_id: id }).orderBy('id').pluck('text');
    expect(said).toEqual(['First.', 'Which revision?', 'Second.']);
  });

  it('holds back the next submittal until it is answered', async () => {
    const id = await commentId();
    need(await decideReview(link, { words: 'Revise and Resubmit' }));
    const next = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, next);
    const sending = { submittalId: next, reviewer: 'RR', email: 'r@x.example', days: 30 };
    const held = await sendSubmittal(office.people.engineer, sending);
    expect(held).toMatchObject({ ok: false, errors: [{ code: 'comments-open' }] });
    expect(!held.ok && held.errors[0]?.message).toMatch(/^Comment 1 on submittal 1 is not answered/);
    need(await answerComment(office.people.engineer, { commentId: id, answer: 'A-201.' }));
    need(await sendSubmittal(office.people.engineer, sending));
  });

  it('is checked back through the link of the next submittal, and through no other job’s', async () => {
    const id = await commentId();
    need(await answerComment(office.people.engineer, { commentId: id, answer: 'A-201.' }));
    const elsewhere = await makeJob(office, '26-777');
    const strange = await checkedSheet(office, elsewhere);
    const other = await draftedSubmittal(office, elsewhere, [strange.revisionId]);
    await sealSubmittal(office, other);
    const otherLink = await reviewLinkOf(await sendTo(office, other));
    const accept = { commentId: id, outcome: 'accepted' };
    await expect(settleComment(otherLink, accept)).rejects.toBeInstanceOf(NotFound);
    const next = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, next);
    const nextLink = await reviewLinkOf(await sendTo(office, next));
    expect((await openReview(nextLink)).earlier.map((c) => c.id)).toEqual([id]);
    need(await settleComment(nextLink, accept));
    expect(await stateOfComment()).toBe('accepted');
  });
});
