import type { Sequelize } from 'sequelize';

import type { Registry } from '@/shared/types/relation';
import type { Actor } from './auth/actor';
import type { Passwords } from './auth/passwords';
import type { Sessions } from './auth/sessions';
import type { Throttle } from './auth/throttle';
import type { Env } from './env';
import type { Log } from './http/log';
import type { Mailer } from './mail/mailer';

/** What the features work with; made once in server/index.ts, and by the tests with their own clock and database. */
export interface Deps {
  env: Env;
  db: Sequelize;
  log: Log;
  now: () => Date;
  newId: () => string;
  passwords: Passwords;
  throttle: Throttle;
  sessions: Sessions;
  mail: Mailer;
  /** the relations at hand, read and verified once at start */
  relations: Registry;
  /** cases that wait for this person as a reviewer: the badge on Reviews */
  reviewsWaiting: (db: Sequelize, who: Actor) => Promise<number>;
}
