/** A date as the page says it, "17 Nov 2026", in the person's zone. */
export function sayDate(at: Date, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone: zone,
  }).format(at);
}

/** A moment, "today 14:02" or its date. */
export function sayMoment(at: Date, zone: string, now = new Date()): string {
  if (sayDate(at, zone) !== sayDate(now, zone)) return sayDate(at, zone);
  const time = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', timeZone: zone });
  return `today ${time.format(at)}`;
}

/** The day a page is read on, "Tuesday 17 November". */
export function sayToday(zone: string, now = new Date()): string {
  return new Intl.DateTimeFormat('en-GB', {
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    timeZone: zone,
  })
    .format(now)
    .replace(',', '');
}
