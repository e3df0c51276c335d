import { grants } from './001-grants';
import { users } from './002-users';
import { sessions } from './003-sessions';
import { rateCounters } from './004-rate-counters';
import { passwordResets } from './005-password-resets';
import { projects } from './006-projects';
import { memberships } from './007-memberships';
import { invitations } from './008-invitations';
import { projectEvents } from './009-project-events';
import { accountEvents } from './010-account-events';
import { mailbox } from './011-mailbox';
import { cases101 } from './101-cases';
import { caseTags102 } from './102-case-tags';
import { caseRevisions103 } from './103-case-revisions';
import { caseEvents104 } from './104-case-events';
import { signatures105 } from './105-signatures';
import { addenda106 } from './106-addenda';
import { reviewChecks107 } from './107-review-checks';
import { reviewQueries108 } from './108-review-queries';
import { queryMessages109 } from './109-query-messages';
import { comments110 } from './110-comments';
import { attachments111 } from './111-attachments';
import { caseCounts112 } from './112-case-counts';
import { caseGuards113 } from './113-case-guards';
import { caseSearch114 } from './114-case-search';
import { caseStamps115 } from './115-case-stamps';
import type { Migration } from './step';

/** Every migration by name, in order: no file is looked up at run time, and the order is reviewed. Never edit one that has run anywhere. */
export const migrations: readonly Migration[] = [
  grants, users, sessions, rateCounters, passwordResets, projects, memberships, invitations, projectEvents, accountEvents, mailbox,
  cases101, caseTags102, caseRevisions103, caseEvents104, signatures105, addenda106, reviewChecks107, reviewQueries108, queryMessages109,
  comments110, attachments111, caseCounts112, caseGuards113, caseSearch114, caseStamps115,
];
