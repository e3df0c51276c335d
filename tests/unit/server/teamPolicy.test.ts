import { accountRefusal, mayAdminister, type AccountChange } from '@/server/features/admin/policy';
import { mayCreateProject, mayInTeam, standingRefusal, TEAM_ACTS, type TeamAct } from '@/server/features/team/policy';
import { PROJECT_ROLES, SITE_ROLES, type ProjectRole, type SiteRole } from '@/shared/types/roles';

/** Who may do what, written out: everything that is not named here is refused. */
const BY_ROLE: Record<ProjectRole | 'none', readonly TeamAct[]> = {
  none: [],
  reader: ['see', 'leave'],
  chemist: ['see', 'leave'],
  reviewer: ['see', 'leave'],
  lead: ['see', 'leave', 'invite', 'withdraw-invitation', 'change-member', 'remove-member', 'change-settings'],
};
const ADMINISTRATOR_ALWAYS: readonly TeamAct[] = ['see'];
const ADMINISTRATOR_WITHOUT_LEAD: readonly TeamAct[] = ['invite', 'withdraw-invitation', 'change-member'];

interface Row { siteRole: SiteRole; isDemo: boolean; role: ProjectRole | null; hasLead: boolean; demoProject: boolean; act: TeamAct }
const rows: Row[] = SITE_ROLES.flatMap((siteRole) => [false, true].flatMap((isDemo) => [null, ...PROJECT_ROLES].flatMap((role) =>
  [false, true].flatMap((hasLead) => [false, true].flatMap((demoProject) => TEAM_ACTS.map((act) => ({ siteRole, isDemo, role, hasLead, demoProject, act })))))));

function expected({ siteRole, isDemo, role, hasLead, demoProject, act }: Row): boolean {
  if (BY_ROLE[role ?? 'none'].includes(act)) return true;
  if (siteRole !== 'administrator' || (isDemo && !demoProject)) return false;
  return ADMINISTRATOR_ALWAYS.includes(act) || (!hasLead && ADMINISTRATOR_WITHOUT_LEAD.includes(act));
}

it('covers every role, act and kind of project', () => expect(rows).toHaveLength(2 * 2 * 5 * 2 * 2 * TEAM_ACTS.length));

it.each(TEAM_ACTS)('%s, for every role in every kind of project', (act) => {
  const told = rows.filter((row) => row.act === act).map((row) => ({ ...row, may: mayInTeam(act, row, { hasLead: row.hasLead, isDemo: row.demoProject }) }));
  expect(told).toEqual(told.map((row) => ({ ...row, may: expected(row) })));
});

it.each([['administrator', true], ['member', false]] as const)('%s opens projects and manages accounts: %s', (siteRole, may) => {
  expect(mayCreateProject({ siteRole })).toBe(may);
  expect(mayAdminister({ siteRole })).toBe(may);
});

describe('what somebody is in a project', () => {
  const today = '2026-12-01';
  it.each(PROJECT_ROLES)('%s without an end is fine while a lead is left', (role) =>
    expect(standingRefusal({ role, guestUntil: null, today, leadsLeft: 1 })).toBeNull());
  it.each([['reader', null], ['chemist', null], ['reviewer', null], ['lead', 'role']] as const)('a guest as %s: refused at %s', (role, field) =>
    expect(standingRefusal({ role, guestUntil: '2026-12-24', today, leadsLeft: 1 })?.field ?? null).toBe(field));
  it('a guest may stay for today, not until yesterday', () => {
    expect(standingRefusal({ role: 'reader', guestUntil: '2026-12-01', today, leadsLeft: 1 })).toBeNull();
    expect(standingRefusal({ role: 'reader', guestUntil: '2026-11-30', today, leadsLeft: 1 })?.field).toBe('guestUntil');
  });
  it('the last lead stays lead', () => expect(standingRefusal({ role: 'chemist', guestUntil: null, today, leadsLeft: 0 })?.field).toBe('role'));
});

describe('accounts', () => {
  const active = { siteRole: 'administrator', status: 'active' } as const;
  const cases: [string, AccountChange, 'siteRole' | 'status' | null][] = [
    ['one of two administrators becomes member', { before: active, after: { ...active, siteRole: 'member' }, isYou: false, otherAdministrators: 1 }, null],
    ['the last administrator becomes member', { before: active, after: { ...active, siteRole: 'member' }, isYou: true, otherAdministrators: 0 }, 'siteRole'],
    ['the last administrator is shut', { before: active, after: { ...active, status: 'disabled' }, isYou: false, otherAdministrators: 0 }, 'status'],
    ['somebody shuts their own account', { before: active, after: { ...active, status: 'disabled' }, isYou: true, otherAdministrators: 3 }, 'status'],
    ['a shut administrator becomes member', { before: { ...active, status: 'disabled' }, after: { siteRole: 'member', status: 'disabled' }, isYou: false, otherAdministrators: 0 }, null],
    ['a member is shut', { before: { siteRole: 'member', status: 'active' }, after: { siteRole: 'member', status: 'disabled' }, isYou: false, otherAdministrators: 0 }, null],
    ['a member becomes administrator', { before: { siteRole: 'member', status: 'active' }, after: active, isYou: false, otherAdministrators: 1 }, null],
  ];
  it.each(cases)('%s', (_name, change, field) => expect(accountRefusal(change)?.field ?? null).toBe(field));
});
