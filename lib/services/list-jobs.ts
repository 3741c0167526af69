// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { findJobs } from '@/db/queries/jobs';
import { sheetLines } from '@/db/queries/sheets';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { sheetName, sheetState } from './sheet-state';

const input = z.object({
  search: z.string().trim().max(80).catch(''),
  sort: z.enum(['number', 'title', 'changed']).catch('changed'),
  state: z.enum(['open', 'closed']).catch('open'),
  page: z.coerce.number().int().min(1).max(10_000).catch(1),
});

const size = 20;

/** Jobs of the office, searched, sorted and paged, each with the state of its sheets. */
export async function listJobs(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const ask = input.parse(raw);
  const { rows, total } = await findJobs(database(), actor.officeId, { ...ask, size });
  const sheets = await sheetLines(
    database(),
    actor.officeId,
    rows.map((r) => r.id),
  );
  return {
    rows: rows.map((r) => ({
      id: r.id,
      number: r.number,
      title: r.title,
      place: r.place,
      authority: r.authority,
      sheets: sheets
        .filter((s) => s.job_id === r.id)
        .map((s) => ({ number: sheetName(s.number), state: sheetState(s) })),
      changedAt: r.changed_at,
    })),
    total,
    page: ask.page,
    pages: Math.max(1, Math.ceil(total / size)),
  };
}
