import { z } from 'zod';

import { LIMITS } from '../limits';
import { day, email, id, instant, optionalText, projectRole, siteRole, text } from './common';

const may = z.object({ invite: z.boolean(), changeMembers: z.boolean(), changeSettings: z.boolean() });
export const member = z.object({ userId: id, name: z.string(), email: z.string(), role: projectRole, guestUntil: day.nullable(), joinedAt: instant, isYou: z.boolean() });
export const invitation = z.object({ id, email: z.string(), role: projectRole, guestUntil: day.nullable(), invitedBy: z.string(), sentAt: instant, expiresAt: instant });
export const project = z.object({
  id, key: z.string(), name: z.string(), notebookPattern: z.string(), claimHours: z.number().int(), reviewDays: z.number().int(),
  /** peers without the reviewer role may review each other's cases; the author never may */
  peerReview: z.boolean(), caseCount: z.number().int(), yourRole: projectRole.nullable(), may, isDemo: z.boolean(),
});

/*
 * GET /api/team · POST /api/projects (createProjectRequest; projectResponse) · GET /api/projects/:projectId · PUT /api/projects/:projectId (changeProjectRequest)
 * POST /api/projects/:projectId/invitations (inviteRequest) · DELETE /api/projects/:projectId/invitations/:invitationId
 * PUT /api/projects/:projectId/members/:userId (changeMemberRequest) · DELETE the same. PUT and POST answer projectResponse, DELETE answers `done`
 * GET /api/admin/users · PUT /api/admin/users/:userId (changeUserRequest): both answer adminUsersResponse · GET /api/mailbox
 */
/** GET /api/team */
export const teamResponse = z.object({ projects: z.array(project), mayCreateProject: z.boolean(), mayAdminister: z.boolean() });
/** GET /api/projects/:projectId */
export const projectResponse = project.extend({ members: z.array(member), invitations: z.array(invitation), log: z.array(z.object({ at: instant, by: z.string(), text: z.string() })) });

export const createProjectRequest = z.strictObject({
  key: z.string().trim().toUpperCase().regex(/^[A-Z][A-Z0-9]{1,5}$/, 'Two to six letters or digits, a letter first: HAZ.'),
  name: text(LIMITS.projectName),
});
export const changeProjectRequest = z.strictObject({
  name: text(LIMITS.projectName), notebookPattern: optionalText(LIMITS.notebook), claimHours: z.int().min(1).max(168), reviewDays: z.int().min(1).max(90), peerReview: z.boolean(),
});
export const inviteRequest = z.strictObject({ email, role: projectRole, guestUntil: day.nullable() });
export const changeMemberRequest = z.strictObject({ role: projectRole, guestUntil: day.nullable() });

/** GET /api/admin/users, administrator only. Site administrators manage accounts; they see no case by that. */
export const adminUsersResponse = z.object({ users: z.array(z.object({
  id, name: z.string(), email: z.string(), siteRole, status: z.enum(['active', 'disabled']), isDemo: z.boolean(), createdAt: instant, lastSignInAt: instant.nullable(), projects: z.array(z.string()),
})) });
export const changeUserRequest = z.strictObject({ siteRole, status: z.enum(['active', 'disabled']) });

/** GET /api/mailbox: what the local mail fake has delivered; only while the demo is loaded. */
export const mailboxResponse = z.object({ messages: z.array(z.object({ id, to: z.string(), subject: z.string(), text: z.string(), at: instant, link: z.string().nullable() })) });

export type ProjectSummary = z.infer<typeof project>;
export type TeamResponse = z.infer<typeof teamResponse>;
export type ProjectResponse = z.infer<typeof projectResponse>;
export type Member = z.infer<typeof member>;
export type AdminUsersResponse = z.infer<typeof adminUsersResponse>;
export type MailboxResponse = z.infer<typeof mailboxResponse>;
