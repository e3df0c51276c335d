import type { Sequelize } from 'sequelize';

import { defineAccountEvent } from './AccountEventModel';
import { defineInvitation } from './InvitationModel';
import { defineMail } from './MailModel';
import { defineMembership } from './MembershipModel';
import { definePasswordReset } from './PasswordResetModel';
import { defineProject } from './ProjectModel';
import { defineProjectEvent } from './ProjectEventModel';
import { defineSession } from './SessionModel';
import { defineUser } from './UserModel';

const definitions: readonly ((sequelize: Sequelize) => unknown)[] = [
  defineUser, defineSession, definePasswordReset, defineProject, defineMembership, defineInvitation, defineProjectEvent, defineAccountEvent, defineMail,
];

/** Binds every model to this connection pool; a process works with one pool at a time. */
export function defineModels(sequelize: Sequelize): void {
  for (const define of definitions) define(sequelize);
}
