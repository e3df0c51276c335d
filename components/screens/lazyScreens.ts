import { lazy } from 'react';

/**
 * The screens of people who sign in arrive together, in one part of the program: what they share among themselves then lies in
 * it, and not in the part that the first page loads.
 */
const load = () => import('./team');
export const CasesScreen = lazy(async () => ({ default: (await load()).CasesScreen }));
export const NewCaseScreen = lazy(async () => ({ default: (await load()).NewCaseScreen }));
export const CaseScreen = lazy(async () => ({ default: (await load()).CaseScreen }));
export const HistoryScreen = lazy(async () => ({ default: (await load()).HistoryScreen }));
export const SheetScreen = lazy(async () => ({ default: (await load()).SheetScreen }));
export const ReviewsScreen = lazy(async () => ({ default: (await load()).ReviewsScreen }));
export const TeamScreen = lazy(async () => ({ default: (await load()).TeamScreen }));
export const ProjectScreen = lazy(async () => ({ default: (await load()).ProjectScreen }));
export const AccountScreen = lazy(async () => ({ default: (await load()).AccountScreen }));
export const SignInScreen = lazy(async () => ({ default: (await load()).SignInScreen }));
export const ForgotScreen = lazy(async () => ({ default: (await load()).ForgotScreen }));
export const ResetScreen = lazy(async () => ({ default: (await load()).ResetScreen }));
export const InvitationScreen = lazy(async () => ({ default: (await load()).InvitationScreen }));
export const AdminScreen = lazy(async () => ({ default: (await load()).AdminScreen }));
export const MailboxScreen = lazy(async () => ({ default: (await load()).MailboxScreen }));
