/** "1 Dec 2026, 14:07 UTC": moments are stored in UTC and printed with their zone. */
export function dateTimeUtc(moment: string | Date): string {
  return dateTimeIn(moment, 'UTC');
}

/** The same moment on the clock of a named zone (IANA name), the zone's short name behind it. @throws RangeError on an unknown zone */
export function dateTimeIn(moment: string | Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZone, timeZoneName: 'short',
  }).formatToParts(toDate(moment));
  const part = (type: Intl.DateTimeFormatPartTypes): string => parts.find((p) => p.type === type)?.value ?? '';
  return `${part('day')} ${month(part('month'))} ${part('year')}, ${part('hour')}:${part('minute')} ${part('timeZoneName')}`;
}

/** "1 Dec 2026" on the calendar of a zone, UTC unless told. */
export function dateOnly(moment: string | Date, timeZone = 'UTC'): string {
  return dateTimeIn(moment, timeZone).split(',')[0] ?? '';
}

/** en-GB prints "Sept" for one month; all months have three letters here. */
const month = (name: string): string => name.slice(0, 3);

function toDate(moment: string | Date): Date {
  const date = typeof moment === 'string' ? new Date(moment) : moment;
  if (Number.isNaN(date.getTime())) throw new RangeError(`not a moment: ${String(moment)}`);
  return date;
}
