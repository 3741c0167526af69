'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { requestAddress } from '@/app/session';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { decideReview } from '@/lib/services/decide-review';
import { reviewDoor } from '@/lib/services/open-review';
import { settleComment } from '@/lib/services/settle-comment';

const closed: FormState = {
  errors: [{ path: '', message: 'This link is closed by now. Nothing was recorded.' }],
  typed: {},
};

/** Pins a comment to a line. */
export async function comment(token: string, _state: FormState, form: FormData): Promise<FormState> {
  const door = await reviewDoor(token, await requestAddress());
  if (!door.open) return closed;
  const [revisionId, line] = String(form.get('place')).split('|');
  const result = await commentOnReview(door.link, {
    revisionId,
    line,
    text: form.get('text'),
    code: form.get('code'),
  });
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath(`/review/${token}`);
  return { errors: [], typed: {}, done: `Comment ${result.value.number} is pinned to line ${line}.` };
}

/** Records the decision, once. */
export async function decide(token: string, _state: FormState, form: FormData): Promise<FormState> {
  const door = await reviewDoor(token, await requestAddress());
  if (!door.open) return closed;
  const result = await decideReview(door.link, { words: form.get('words') ?? '' });
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath(`/review/${token}`);
  return { errors: [], typed: {}, done: 'The decision is recorded.' };
}

/** Accepts the answer to a comment, or opens the comment again. */
export async function settle(
  token: string,
  commentId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const door = await reviewDoor(token, await requestAddress());
  if (!door.open) return closed;
  const outcome = form.get('outcome');
  const result = await settleComment(door.link, { commentId, outcome, text: form.get('text') ?? '' });
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath(`/review/${token}`);
  return { errors: [], typed: {}, done: 'It is recorded.' };
}
