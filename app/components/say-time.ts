/** The time of day of a moment, "14:02", in the person's zone. */
export function sayTime(at: Date, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', timeZone: zone }).format(at);
}
