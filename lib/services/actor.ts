import { z } from 'zod';

export const role = z.enum(['administrator', 'engineer', 'checker', 'engineer-of-record']);
export type Role = z.infer<typeof role>;

/** Who acts: a signed-in person of one office. */
export interface Actor {
  personId: string;
  officeId: string;
  officeName: string;
  zone: string;
  roles: Role[];
  name: string;
  initials: string;
  email: string;
}
