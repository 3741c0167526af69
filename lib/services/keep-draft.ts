// server only
import { z } from 'zod';
import { insertDraft, newestDraft, renameSheet, sheetById } from '@/db/queries/sheets';
import { type Draft, draft as draftSchema } from '@/lib/model/draft';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { requireWriter } from './require-writer';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';

const input = z.object({ sheetId: z.string().max(36), version: z.number().int().min(0), draft: draftSchema });

export type KeptDraft =
  | { ok: true; version: number; keptAt: Date }
  | { ok: false; version: number; draft: unknown; by: string; at: Date };

/** Keeps a draft on top of the version it was made from. When another version stands there by now, nothing is written. */
export async function keepDraft(
  actor: Actor,
  raw: { sheetId: string; version: number; draft: Draft },
): Promise<KeptDraft> {
  requireRole(actor, ...makers, 'checker');
  const { sheetId, version, draft } = input.parse(raw);
  const { officeId, personId } = actor;
  const kept = await inTransaction(actor, async (trx, record): Promise<KeptDraft> => {
    const newest = await newestDraft(trx, officeId, sheetId, true);
    const sheet = await sheetById(trx, officeId, sheetId);
    if (!newest || !sheet) throw new NotFound(`sheet ${sheetId}`);
    await requireWriter(trx, actor, sheetId);
    const name = `${sheetName(sheet.number)} draft`;
    const about = { jobId: sheet.job_id, aboutId: sheetId };
    if (newest.version !== version) {
      await record('met another version', name, about);
      return {
        ok: false,
        version: newest.version,
        draft: newest.body,
        by: newest.name,
        at: newest.kept_at,
      };
    }
    const at = new Date();
    await insertDraft(trx, { sheetId, officeId, version: version + 1, body: draft, by: personId, at });
    const title = draft.title.trim().slice(0, 120);
    if (title !== sheet.title && title !== '') await renameSheet(trx, officeId, sheetId, title);
    await record('kept', `${name} ${version + 1}`, about);
    return { ok: true, version: version + 1, keptAt: at };
  });
  if (!kept.ok) throw new Error('keeping a draft is never refused');
  return kept.value;
}
