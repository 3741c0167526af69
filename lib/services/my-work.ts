// server only
import { database } from '@/db/connection';
import { officeById } from '@/db/queries/offices';
import {
  commentsToAnswer,
  openChecksAround,
  returnedChecksOf,
  type SubmittalWork,
  submittalWork,
} from '@/db/queries/work';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { sheetName } from './sheet-state';

export interface Work {
  text: string;
  href: string;
  job: string;
  since: Date;
  /** Whole days since then. */
  days: number;
  /** Waits longer than the office allows, or needs a person to go on at all. */
  late: boolean;
}

type Found = Omit<Work, 'days' | 'late'> & { late?: boolean };

/** What waits on this person, and what this person waits for, in jobs that are open; the oldest first. */
export async function myWork(actor: Actor, now = new Date()): Promise<{ toDo: Work[]; waiting: Work[] }> {
  requireRole(actor, ...everyone);
  const db = database();
  const { officeId, personId } = actor;
  const [office, checks, returned, submittals, comments] = await Promise.all([
    officeById(db, officeId),
    openChecksAround(db, officeId, personId),
    returnedChecksOf(db, officeId, personId),
    submittalWork(db, officeId, personId),
    commentsToAnswer(db, officeId, personId),
  ]);
  if (!office) throw new Error('the office of a signed-in person is gone');
  const job = (r: { job_number: string; job_title: string }) => `${r.job_number} ${r.job_title}`;
  const toDo: Found[] = [
    ...checks
      .filter((c) => Number(c.mine) === 1)
      .map((c) => ({
        text: `Check ${sheetName(c.number)} ${c.title}`,
        href: `/jobs/${c.job_id}/checks/${c.id}`,
        job: job(c),
        since: c.since,
      })),
    ...returned.map((c) => ({
      text: `Correct ${sheetName(c.number)} ${c.title}, returned by ${c.checker}`,
      href: `/jobs/${c.job_id}/sheets/${c.id}`,
      job: job(c),
      since: c.since,
    })),
    ...comments.map((c) => ({
      text: `Answer ${Number(c.count) === 1 ? 'one comment' : `${c.count} comments`} on submittal ${c.number}`,
      href: `/jobs/${c.job_id}/submittals/${c.id}`,
      job: job(c),
      since: c.since,
    })),
    ...submittals.flatMap((s) => submittalToDo(s, now).map((found) => ({ ...found, job: job(s) }))),
  ];
  const waiting: Found[] = [
    ...checks
      .filter((c) => Number(c.mine) !== 1)
      .map((c) => ({
        text: `${sheetName(c.number)} ${c.title} is with ${c.checker} to check`,
        href: `/jobs/${c.job_id}/revisions/${c.revision_id}`,
        job: job(c),
        since: c.since,
      })),
    ...submittals.flatMap((s) => submittalWaits(s, now).map((found) => ({ ...found, job: job(s) }))),
  ];
  const finish = (found: Found[]): Work[] =>
    found
      .map((f) => {
        const days = Math.floor((now.getTime() - f.since.getTime()) / 86_400_000);
        return { ...f, days, late: f.late === true || days > office.late_after };
      })
      .toSorted((a, b) => a.since.getTime() - b.since.getTime());
  return { toDo: finish(toDo), waiting: finish(waiting) };
}

const runOut = (s: SubmittalWork, now: Date) => s.link_ends === null || s.link_ends < now;

function submittalToDo(s: SubmittalWork, now: Date): Omit<Found, 'job'>[] {
  const href = `/jobs/${s.job_id}/submittals/${s.id}`;
  if (s.state === 'drafted')
    return Number(s.seals) === 1
      ? [{ text: `Seal submittal ${s.number}`, href: `${href}/seal`, since: s.since }]
      : [];
  if (s.state === 'sealed') return [{ text: `Send submittal ${s.number}, sealed`, href, since: s.since }];
  const since = s.last_sent ?? s.since;
  if (Number(s.refused) > 0)
    return [{ text: `A letter with submittal ${s.number} was refused`, href, since, late: true }];
  if (runOut(s, now))
    return [
      { text: `Nobody can open submittal ${s.number}: no link to it is good`, href, since, late: true },
    ];
  return [];
}

function submittalWaits(s: SubmittalWork, now: Date): Omit<Found, 'job'>[] {
  const href = `/jobs/${s.job_id}/submittals/${s.id}`;
  if (s.state === 'drafted' && Number(s.seals) !== 1)
    return [{ text: `Submittal ${s.number} waits for the seal of ${s.engineer}`, href, since: s.since }];
  if (s.state === 'sent' && !runOut(s, now))
    return [{ text: `Submittal ${s.number} is with the reviewer`, href, since: s.last_sent ?? s.since }];
  return [];
}
