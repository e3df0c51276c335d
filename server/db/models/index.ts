import type { Sequelize } from 'sequelize';

import { defineAccountEvent } from './AccountEventModel';
import { defineAddendum } from './AddendumModel';
import { defineAttachment } from './AttachmentModel';
import { defineCase } from './CaseModel';
import { defineCaseEvent } from './CaseEventModel';
import { defineCaseRevision } from './CaseRevisionModel';
import { defineCaseTag } from './CaseTagModel';
import { defineComment } from './CommentModel';
import { defineInvitation } from './InvitationModel';
import { defineMail } from './MailModel';
import { defineMembership } from './MembershipModel';
import { definePasswordReset } from './PasswordResetModel';
import { defineProject } from './ProjectModel';
import { defineProjectEvent } from './ProjectEventModel';
import { defineQueryMessage } from './QueryMessageModel';
import { defineReviewCheck } from './ReviewCheckModel';
import { defineReviewQuery } from './ReviewQueryModel';
import { defineSession } from './SessionModel';
import { defineSignature } from './SignatureModel';
import { defineUser } from './UserModel';

const definitions: readonly ((sequelize: Sequelize) => unknown)[] = [
  defineUser, defineSession, definePasswordReset, defineProject, defineMembership, defineInvitation, defineProjectEvent, defineAccountEvent, defineMail,
  defineCase, defineCaseTag, defineCaseRevision, defineCaseEvent, defineSignature, defineAddendum,
  defineReviewCheck, defineReviewQuery, defineQueryMessage, defineComment, defineAttachment,
];

/** Binds every model to this connection pool; a process works with one pool at a time. */
export function defineModels(sequelize: Sequelize): void {
  for (const define of definitions) define(sequelize);
}
