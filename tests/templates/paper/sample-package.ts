import type { PackagePrint, PackageSheet } from '@/templates/paper/package-print';
import { sheet } from './sample-sheet';

const issued = (number: string, title: string, more: Partial<PackageSheet> = {}): PackageSheet =>
  ({
    ...sheet,
    kind: 'calculated',
    number,
    title,
    revision: 1,
    originator: { initials: 'MT', date: '2026-10-08' },
    checker: { initials: 'JO', date: '2026-10-12' },
    digest: '5e1f 90c7',
    ...more,
  }) as PackageSheet;

/** An invented job with two sheets. */
export const samplePackage: PackagePrint = {
  office: 'Tern & Alder Structures',
  job: {
    number: '26-041',
    title: 'Quayside Ferry Shelter',
    place: 'Strand Quay 4, Port Halden',
    client: 'Halden Ferries',
    authority: 'Port Halden Building Office, plan review',
    codes: ['EN 1990', 'EN 1991-1-1', 'EN 1991-1-3', 'EN 1991-1-4', 'EN 1993-1-1'],
  },
  purpose: 'Submittal 2, for approval',
  submittal: 2,
  previous: 1,
  mode: 'preliminary',
  size: 'Letter',
  language: 'en-GB',
  date: new Date('2026-11-18T09:00:00Z'),
  digest: 'd41c 5a90',
  people: {
    originators: [
      { name: 'Maren Tveit', initials: 'MT' },
      { name: 'Hanne Nørby', initials: 'HN' },
    ],
    checkers: [{ name: 'Joseph Okafor', initials: 'JO' }],
    engineer: { name: 'Elin Varga', initials: 'EV' },
  },
  sheets: [
    issued('S-02', 'Roof purlin, two spans', { marks: undefined }),
    issued('S-03', 'Portal frame, grid 2', { revision: 2, since: 'changed' }),
    issued('S-04', 'Canopy bracket at C', { revision: 0, since: 'new' }),
  ],
  seal: { on: 'every-page', covers: 'S-02 to S-04' },
  data: {
    name: '26-041-submittal-2.json',
    description: 'Inputs and results of the sheets',
    bytes: new TextEncoder().encode('{"job":"26-041"}'),
  },
};
