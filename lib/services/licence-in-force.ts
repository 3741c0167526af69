import type { LicenceRow } from '@/db/queries/people';
import { dayIn } from './day-in';

/** Whether a licence is in force at an instant: to the end of its last day, by the calendar of the office. */
export function licenceInForce(licence: Pick<LicenceRow, 'expires'>, at: Date, zone: string): boolean {
  return dayIn(zone, at) <= licence.expires.toISOString().slice(0, 10);
}
