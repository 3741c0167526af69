// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { changeAuthority, insertAuthority } from '@/db/queries/jobs';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({
  authorityId: z.string().max(36).optional(),
  name: z.string().trim().min(2, 'Type the name of the authority.').max(120),
  decisions: z
    .array(z.string().trim().min(1, 'A decision needs its words.').max(80))
    .min(1, 'Type at least one decision, in the words of the authority.')
    .max(20)
    .refine((words) => new Set(words).size === words.length, 'Two decisions have the same words.'),
  reviewer: z.string().trim().max(120).optional(),
  email: z.email('Type the e-mail address of the reviewer.').max(190).optional(),
  wish: z.enum(['link', 'attachment']).default('link'),
  checklist: z
    .array(z.string().trim().min(1).max(200, 'A line has at most 200 letters.'))
    .max(40)
    .default([]),
});

/** Enters an authority, or changes one: its name, its words for decisions, its usual reviewer, what it asks for. */
export async function keepAuthority(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { authorityId, name, decisions, reviewer, email, wish, checklist } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const id = authorityId ?? randomUUID();
    const row = {
      id,
      office_id: actor.officeId,
      name,
      decisions,
      reviewer: reviewer ?? null,
      email: email ?? null,
      wish,
      checklist,
    };
    if (authorityId === undefined) await insertAuthority(trx, row);
    else if ((await changeAuthority(trx, row)) !== 1) throw new NotFound(`authority ${authorityId}`);
    await record('kept an authority', `${name}: ${decisions.join(', ')}`.slice(0, 400), { aboutId: id });
    return { id };
  });
}
