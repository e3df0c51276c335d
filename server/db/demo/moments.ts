import type { Moment } from './story';

const DAY_MS = 24 * 3600 * 1000;

/** Turns "so many days ago at that time" into instants, counted from the day of loading. Nothing lies in the future. */
export function storyClock(loadedAt: Date): { instant: (moment: Moment) => Date; day: (inDays: number) => string } {
  const midnight = Date.UTC(loadedAt.getUTCFullYear(), loadedAt.getUTCMonth(), loadedAt.getUTCDate());
  return {
    instant: ({ daysAgo, time }) => {
      const [hours = 0, minutes = 0] = time.split(':').map(Number);
      const at = midnight - daysAgo * DAY_MS + (hours * 60 + minutes) * 60_000;
      return new Date(Math.min(at, loadedAt.getTime()));
    },
    day: (inDays) => new Date(midnight + inDays * DAY_MS).toISOString().slice(0, 10),
  };
}
