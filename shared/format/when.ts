/**
 * Times as a screen shows them: in the reader's own zone (`zone`, an IANA name; the browser's when left out), short where the
 * moment is near. Pure: "now" is always passed in. Months are written as words, so that no order of digits is guessed.
 */
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;
const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

interface Parts { year: number; month: number; day: number; clock: string }

function partsIn(at: Date, zone?: string): Parts {
  const format = new Intl.DateTimeFormat('en-GB', { timeZone: zone, year: 'numeric', month: 'numeric', day: 'numeric', hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });
  const found = Object.fromEntries(format.formatToParts(at).map((part) => [part.type, part.value]));
  return { year: Number(found.year), month: Number(found.month), day: Number(found.day), clock: `${found.hour ?? ''}:${found.minute ?? ''}` };
}

const dayName = (parts: { year: number; month: number; day: number }, nowYear: number): string =>
  `${parts.day}\u00A0${MONTHS[parts.month - 1] ?? ''}${parts.year === nowYear ? '' : `\u00A0${parts.year}`}`;

/** "2 h", "3 d", "5 wk": how long ago, coarse on purpose; "now" under a minute and for a clock that runs ahead. */
export function ago(instant: string, now: Date): string {
  const ms = now.getTime() - Date.parse(instant);
  if (ms < MINUTE_MS) return 'now';
  if (ms < HOUR_MS) return `${Math.floor(ms / MINUTE_MS)}\u00A0min`;
  if (ms < DAY_MS) return `${Math.floor(ms / HOUR_MS)}\u00A0h`;
  if (ms < 14 * DAY_MS) return `${Math.floor(ms / DAY_MS)}\u00A0d`;
  return `${Math.floor(ms / (7 * DAY_MS))}\u00A0wk`;
}

/** "waiting 4 days": whole days, hours under one day. */
export function waited(instant: string, now: Date): string {
  const ms = Math.max(0, now.getTime() - Date.parse(instant));
  const count = (n: number, word: string) => `${n}\u00A0${word}${n === 1 ? '' : 's'}`;
  if (ms < HOUR_MS) return 'less than an hour';
  if (ms < DAY_MS) return count(Math.floor(ms / HOUR_MS), 'hour');
  return count(Math.floor(ms / DAY_MS), 'day');
}

/** "4 Dec", with the year when it is another one. `day` is ISO, without a zone. */
export function dayWords(day: string, now: Date, zone?: string): string {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number];
  return dayName({ year, month, day: date }, partsIn(now, zone).year);
}

/** "14:06" today, "30 Nov, 16:05" else. */
export function momentWords(instant: string, now: Date, zone?: string): string {
  const [then, today] = [partsIn(new Date(instant), zone), partsIn(now, zone)];
  const isToday = then.year === today.year && then.month === today.month && then.day === today.day;
  return isToday ? then.clock : `${dayName(then, today.year)}, ${then.clock}`;
}


/** Is the day before today, where the reader is? */
export function isPast(day: string, now: Date, zone?: string): boolean {
  const today = partsIn(now, zone);
  return day < `${today.year}-${String(today.month).padStart(2, '0')}-${String(today.day).padStart(2, '0')}`;
}
export function isSoon(day: string, now: Date, days: number): boolean {
  return Date.parse(`${day}T23:59:59Z`) - now.getTime() < days * DAY_MS;
}
