import { z } from 'zod';

import { LIMITS } from '../limits';
import { day, email, id, password, projectRole, siteRole, text } from './common';

/*
 * Who is asking. Every call below answers `sessionResponse` unless it says `done`:
 * GET /api/session · POST /api/session (signInRequest) · DELETE /api/session (sign out) · POST /api/session/end-all {} (sign out everywhere)
 * PUT /api/account/name (changeNameRequest) · PUT /api/account/password (changePasswordRequest; ends all other sessions)
 * POST /api/password/forgot (forgotPasswordRequest; done, the same for every address) · POST /api/password/reset (resetPasswordRequest; done)
 * GET /api/invitations/:token (invitationView) · POST /api/invitations/:token/accept (acceptInvitationRequest; signs in)
 */
/** GET /api/session: who is asking, and what the shell needs. `user` null = nobody signed in. Never cached. */
export const sessionResponse = z.object({
  user: z.object({
    id, name: z.string(), email: z.string(), siteRole, isDemo: z.boolean(),
    projects: z.array(z.object({ id, key: z.string(), name: z.string(), role: projectRole, guestUntil: day.nullable() })),
  }).nullable(),
  /** cases this person holds or could take: the badge on Reviews */
  reviewsWaiting: z.number().int(),
  /** demo accounts exist: a strip says so; `mailbox` = the local mailbox page may be shown */
  demo: z.object({ accounts: z.array(z.object({ email: z.string(), name: z.string(), role: z.string() })), password: z.string(), mailbox: z.boolean() }).nullable(),
});

export const signInRequest = z.strictObject({ email, password: z.string().min(1, 'Type your password.').max(LIMITS.passwordMax) });
export const changePasswordRequest = z.strictObject({ current: z.string().min(1, 'Type your present password.').max(LIMITS.passwordMax), next: password });
export const changeNameRequest = z.strictObject({ name: text(LIMITS.personName) });
export const forgotPasswordRequest = z.strictObject({ email });
export const resetPasswordRequest = z.strictObject({ token: z.string().min(20).max(200), next: password });

/** GET /api/invitations/:token, POST /api/invitations/:token/accept (name and password only for a new account). */
export const invitationView = z.object({
  email: z.string(), projectName: z.string(), role: projectRole, guestUntil: day.nullable(), invitedBy: z.string(), hasAccount: z.boolean(),
});
export const acceptInvitationRequest = z.strictObject({ name: text(LIMITS.personName).optional(), password: z.string().min(1).max(LIMITS.passwordMax) });

export type SessionResponse = z.infer<typeof sessionResponse>;
export type SignInRequest = z.input<typeof signInRequest>;
export type InvitationView = z.infer<typeof invitationView>;
