import type { Sequelize } from 'sequelize';

import type { Mailer } from '@/server/mail/mailer';
import type { CaseContent } from '@/shared/types/case';
import type { QuickLookInput, QuickLookResult } from '@/shared/types/answer';
import type { CaseTrail } from '@/shared/types/trail';

/** What cases and reviews work with; the demo hands in its own clock and a confirmation that asks no password. */
export interface CaseDeps {
  db: Sequelize;
  now: () => Date;
  newId: () => string;
  mail: Pick<Mailer, 'post'>;
  /** the password asked again. @throws Problem when it is not this person's, or was tried too often */
  confirm: (userId: string, password: string) => Promise<unknown>;
  /** the engine with the relations at hand */
  trailOf: (content: CaseContent) => CaseTrail;
  quickLook: (input: QuickLookInput) => QuickLookResult;
}

/** Where the links of a mail lead. */
export interface Origin {
  origin: string;
}
