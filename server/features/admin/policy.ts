import { problemText } from '@/shared/text/problems';
import type { SiteRole } from '@/shared/types/roles';

/** Accounts are an administrator's to manage; cases are not (their roles in projects decide those). */
export const mayAdminister = (who: { siteRole: SiteRole }): boolean => who.siteRole === 'administrator';

export interface AccountChange {
  before: { siteRole: SiteRole; status: 'active' | 'disabled' };
  after: { siteRole: SiteRole; status: 'active' | 'disabled' };
  isYou: boolean;
  /** administrators who can sign in, the person in question left out */
  otherAdministrators: number;
}

/** Why an account cannot be changed so, or null. */
export function accountRefusal({ before, after, isYou, otherAdministrators }: AccountChange): { field: 'siteRole' | 'status'; why: string } | null {
  if (isYou && after.status === 'disabled') return { field: 'status', why: problemText.ownAccount };
  const wasAdministrator = before.siteRole === 'administrator' && before.status === 'active';
  const staysAdministrator = after.siteRole === 'administrator' && after.status === 'active';
  if (wasAdministrator && !staysAdministrator && otherAdministrators === 0) {
    return { field: after.siteRole === 'administrator' ? 'status' : 'siteRole', why: problemText.lastAdministrator };
  }
  return null;
}
