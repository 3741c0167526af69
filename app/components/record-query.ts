import { z } from 'zod';
import type { readAudit } from '@/lib/services/read-audit';
import { sayDate } from './say-date';
import { sayTime } from './say-time';

/** What the address of a record page asks for. */
export const recordQuery = z.object({
  about: z.string().max(64).catch(''),
  person: z.string().max(36).catch(''),
  drafts: z.enum(['', 'shown']).catch(''),
  page: z.coerce.number().int().min(1).catch(1),
});

export type RecordQuery = z.infer<typeof recordQuery>;

/** As the service takes it. */
export function recordFilter(query: RecordQuery) {
  return {
    aboutId: query.about || undefined,
    personId: query.person || undefined,
    withoutDrafts: query.drafts === '',
    page: query.page,
  };
}

export function recordHref(base: string, query: RecordQuery, page: number): string {
  const asked = Object.entries({ ...query, page: page === 1 ? '' : String(page) });
  const search = new URLSearchParams(asked.filter(([, value]) => value !== ''));
  return search.size === 0 ? base : `${base}?${search}`;
}

/** What the walk of the last night found, in words. */
export function sayWalk(walked: Awaited<ReturnType<typeof readAudit>>['walked'], zone: string): string {
  if (!walked) return 'No night has walked it yet.';
  const when = `${sayDate(walked.at, zone)}, ${sayTime(walked.at, zone)}`;
  return walked.broken === null
    ? `The walk of ${when} found all ${walked.entries} entries in order.`
    : `The walk of ${when} found it broken at entry ${walked.broken + 1}.`;
}
