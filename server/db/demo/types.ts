import type { Sequelize } from 'sequelize';

import type { Passwords } from '@/server/auth/passwords';

/** What loading and removing the invented example needs. `owner` may delete rows that only grow for everybody else. */
export interface DemoDeps {
  owner: Sequelize;
  passwords: Passwords;
  now: () => Date;
  newId: () => string;
}

export interface Demo {
  load: (deps: DemoDeps) => Promise<void>;
  remove: (deps: DemoDeps) => Promise<void>;
  reset: (deps: DemoDeps) => Promise<void>;
}
