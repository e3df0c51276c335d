import { createHash } from 'node:crypto';
import { QueryTypes, type Sequelize } from 'sequelize';

import { Problem } from '@/server/http/problems';
import { problemText } from '@/shared/text/problems';

/** How often one thing may be tried in a window. The counters live in the database: a restart forgives nothing. */
export interface Limit {
  name: string;
  most: number;
  windowMs: number;
}
const MINUTE = 60_000;
export const THROTTLES = {
  /** wrong passwords for one account, wherever they come from */
  signInPerEmail: { name: 'sign-in-email', most: 8, windowMs: 15 * MINUTE },
  /** wrong passwords from one address: a whole lab may sit behind it */
  signInPerAddress: { name: 'sign-in-address', most: 60, windowMs: 15 * MINUTE },
  /** the password asked again, for signing and for changing it */
  passwordAgain: { name: 'password-again', most: 8, windowMs: 15 * MINUTE },
  resetPerEmail: { name: 'reset-email', most: 3, windowMs: 60 * MINUTE },
  resetPerAddress: { name: 'reset-address', most: 30, windowMs: 60 * MINUTE },
  tokenPerAddress: { name: 'token-address', most: 60, windowMs: 15 * MINUTE },
  invitePerPerson: { name: 'invite-person', most: 60, windowMs: 60 * MINUTE },
  invitePerEmail: { name: 'invite-email', most: 5, windowMs: 60 * MINUTE },
} as const satisfies Record<string, Limit>;

export interface Throttle {
  /** Counts one try. @throws Problem too-many-tries when it is one too many */
  take: (limit: Limit, subject: string) => Promise<void>;
  /** Takes a try back that turned out to be right. */
  giveBack: (limit: Limit, subject: string) => Promise<void>;
}

/** Of the address or name only a hash is kept. */
const bucketOf = (limit: Limit, subject: string) => createHash('sha256').update(`${limit.name}\n${subject}`).digest('hex');

export function createThrottle({ db, now }: { db: Sequelize; now: () => Date }): Throttle {
  const windowOf = (limit: Limit) => new Date(Math.floor(now().getTime() / limit.windowMs) * limit.windowMs);
  return {
    take: async (limit, subject) => {
      const start = windowOf(limit);
      // One statement, so that tries at the same moment are all counted.
      const [row] = await db.query<{ hits: number }>(
        'INSERT INTO rate_counters (bucket, window_start, hits) VALUES (:bucket, :start, 1) ON DUPLICATE KEY UPDATE hits = hits + 1 RETURNING hits',
        { replacements: { bucket: bucketOf(limit, subject), start }, type: QueryTypes.SELECT });
      const hits = row?.hits ?? 1;
      if (hits === 1) await forget(db, now());
      if (hits <= limit.most) return;
      const waitMs = start.getTime() + limit.windowMs - now().getTime();
      throw new Problem('too-many-tries', problemText.tooManyTries(Math.max(1, Math.ceil(waitMs / MINUTE))), { retryAfterS: Math.max(1, Math.ceil(waitMs / 1000)) });
    },
    giveBack: async (limit, subject) => {
      await db.query('UPDATE rate_counters SET hits = hits - 1 WHERE bucket = :bucket AND window_start = :start AND hits > 0',
        { replacements: { bucket: bucketOf(limit, subject), start: windowOf(limit) }, type: QueryTypes.UPDATE });
    },
  };
}

/** Clears a few windows that ended more than a day ago, each time a new one begins. */
const forget = (db: Sequelize, now: Date): Promise<unknown> =>
  db.query('DELETE FROM rate_counters WHERE window_start < :before LIMIT 200', { replacements: { before: new Date(now.getTime() - 24 * 60 * MINUTE) }, type: QueryTypes.RAW });
