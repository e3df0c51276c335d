import { problemText } from '@/shared/text/problems';
import type { ProjectRole, SiteRole } from '@/shared/types/roles';

export const TEAM_ACTS = ['see', 'invite', 'withdraw-invitation', 'change-member', 'remove-member', 'leave', 'change-settings'] as const;
export type TeamAct = (typeof TEAM_ACTS)[number];

/** Who asks, in the light of one project. `role` null = not in it (a guest whose date has passed is not in it). */
export interface TeamActor {
  siteRole: SiteRole;
  role: ProjectRole | null;
  /** of the invented example: its administrator's password is known to all, so that role ends at its own projects */
  isDemo: boolean;
}
export interface TeamProject {
  isDemo: boolean;
  /** somebody who can still sign in leads it */
  hasLead: boolean;
}

/** An administrator sees which projects there are and who is in them, and steps in only where nobody leads any more. */
const administers = ({ siteRole, isDemo }: TeamActor, project: TeamProject) => siteRole === 'administrator' && (!isDemo || project.isDemo);
const isCaretaker = (who: TeamActor, project: TeamProject) => administers(who, project) && !project.hasLead;

const rules: Readonly<Record<TeamAct, (who: TeamActor, project: TeamProject) => boolean>> = {
  see: (who, project) => who.role !== null || administers(who, project),
  invite: (who, project) => who.role === 'lead' || isCaretaker(who, project),
  'withdraw-invitation': (who, project) => who.role === 'lead' || isCaretaker(who, project),
  'change-member': (who, project) => who.role === 'lead' || isCaretaker(who, project),
  'remove-member': (who) => who.role === 'lead',
  leave: (who) => who.role !== null,
  'change-settings': (who) => who.role === 'lead',
};

export const mayCreateProject = (who: { siteRole: SiteRole }): boolean => who.siteRole === 'administrator';
export const mayInTeam = (act: TeamAct, who: TeamActor, project: TeamProject): boolean => rules[act](who, project);

/** Why what is wished for a member cannot be, or null. `leadsLeft` = active leads there would be afterwards. */
export function standingRefusal({ role, guestUntil, today, leadsLeft }: { role: ProjectRole; guestUntil: string | null; today: string; leadsLeft: number }): { field: 'role' | 'guestUntil'; why: string } | null {
  if (guestUntil !== null && role === 'lead') return { field: 'role', why: problemText.guestLead };
  if (guestUntil !== null && guestUntil < today) return { field: 'guestUntil', why: problemText.endInPast };
  if (leadsLeft === 0) return { field: 'role', why: problemText.lastLead };
  return null;
}
