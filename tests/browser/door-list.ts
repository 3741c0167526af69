import { randomUUID } from 'node:crypto';
import type { Role } from '@/lib/services/actor';
import type { Filled } from '../database/fill-record';

export interface Door {
  /** As the folders of app name it. */
  route: string;
  path: (f: Filled) => string;
  /** Whether it needs no sign-in. */
  open?: boolean;
  /** Who may go through. */
  roles: Role[];
  /** Whether it shows something that belongs to one office. */
  thing?: boolean;
  /** How it is asked for, when not by GET. */
  method?: 'POST';
  /** What those who may see; 404 where the thing is gone by its nature. */
  status?: number;
}

const everyone: Role[] = ['administrator', 'engineer', 'checker', 'engineer-of-record'];
const makers: Role[] = ['engineer', 'engineer-of-record'];

const open = (route: string): Door => ({ route, path: () => route, open: true, roles: [] });
const own = (route: string, roles: Role[] = everyone): Door => ({ route, path: () => route, roles });
const inJob = (rest: string, path: (f: Filled) => string, roles: Role[] = everyone): Door => ({
  route: `/jobs/[job]${rest}`,
  path: (f) => `/jobs/${f.jobId}${path(f)}`,
  roles,
  thing: true,
});

/** Every page and route handler, and who may go through it. */
export const doors: Door[] = [
  open('/'),
  open('/api/v1/analyses'),
  open('/api/v1/analyses/schema'),
  open('/demo/mail'),
  open('/forgotten-password'),
  open('/invitation/[token]'),
  open('/reset-password/[token]'),
  open('/review/[token]'),
  open('/review/[token]/file'),
  open('/sign-in'),
  open('/sign-in/second-step'),
  open('/verify'),
  open('/verify/file'),
  own('/account'),
  own('/account/two-factor'),
  own('/jobs'),
  own('/jobs/start', ['administrator', ...makers]),
  own('/office'),
  own('/office/record'),
  {
    route: '/office/people/[person]',
    path: (f) => `/office/people/${f.office.people.engineer.personId}`,
    roles: ['administrator'],
    thing: true,
  },
  {
    route: '/office/authorities/[authority]',
    path: (f) => `/office/authorities/${f.office.authorityId}`,
    roles: ['administrator'],
    thing: true,
  },
  inJob('', () => ''),
  { ...inJob('/export', () => '/export', ['administrator', ...makers]), method: 'POST' },
  inJob('/record', () => '/record'),
  inJob('/comments', () => '/comments'),
  inJob('/comments/letter', () => '/comments/letter'),
  inJob('/people', () => '/people', ['administrator', ...makers]),
  inJob('/sheets/new', () => '/sheets/new', makers),
  inJob('/sheets/[sheet]', (f) => `/sheets/${f.frozen.sheetId}`),
  inJob('/revisions/[revision]', (f) => `/revisions/${f.frozen.revisionId}`),
  {
    // A first revision has nothing before it to be compared with.
    ...inJob('/revisions/[revision]/changes', (f) => `/revisions/${f.frozen.revisionId}/changes`),
    status: 404,
  },
  inJob('/checks/[check]', (f) => `/checks/${f.sent.checkId}`),
  { ...inJob('/checks/[check]/comparison', (f) => `/checks/${f.sent.checkId}/comparison`), status: 404 },
  inJob('/checks/[check]/certificate', (f) => `/checks/${f.sent.checkId}/certificate`),
  inJob('/checks/[check]/inputs', (f) => `/checks/${f.sent.checkId}/inputs`),
  inJob('/submittals/new', () => '/submittals/new', makers),
  inJob('/submittals/[submittal]', (f) => `/submittals/${f.sent.submittalId}`),
  inJob('/submittals/[submittal]/file', (f) => `/submittals/${f.sent.submittalId}/file`),
  inJob('/submittals/[submittal]/seal', (f) => `/submittals/${f.sent.submittalId}/seal`, [
    'engineer-of-record',
  ]),
  {
    ...inJob(
      '/submittals/[submittal]/prepared/[prepared]',
      (f) => `/submittals/${f.sent.submittalId}/prepared/${randomUUID()}`,
      ['engineer-of-record'],
    ),
    status: 404,
  },
];
