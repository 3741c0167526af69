import { z } from 'zod';

/** What the list of jobs is asked, as it stands in the address. Anything unreadable falls back to the whole list. */
export const jobsQuery = z.object({
  search: z.string().trim().max(80).catch(''),
  sort: z.enum(['changed', 'number', 'title']).catch('changed'),
  state: z.enum(['open', 'closed']).catch('open'),
  page: z.coerce.number().int().min(1).catch(1),
});

export type JobsQuery = z.infer<typeof jobsQuery>;

/** The address of the list with some of its questions changed; a new question starts at the first page. */
export function jobsHref(query: JobsQuery, change: Partial<JobsQuery>): string {
  const next = { ...query, page: 1, ...change };
  const params = new URLSearchParams();
  if (next.search) params.set('search', next.search);
  if (next.sort !== 'changed') params.set('sort', next.sort);
  if (next.state !== 'open') params.set('state', next.state);
  if (next.page > 1) params.set('page', String(next.page));
  const asked = params.toString();
  return asked ? `/jobs?${asked}` : '/jobs';
}
