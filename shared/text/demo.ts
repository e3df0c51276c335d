/** What the demo commands say, on the terminal of whoever runs them. */
const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

export const demoText = {
  alreadyThere: 'The demo is loaded already; "npm run demo -- reset" sets it back to its first day.',
  notThere: 'There is no demo to remove.',
  loaded: (cases: number) => `The demo is loaded: five accounts, three projects and ${cases} cases, all invented.`,
  removed: ({ projects, cases, accounts, kept }: { projects: number; cases: number; accounts: number; kept: number }) =>
    `The demo is removed: ${counted(projects, 'project', 'projects')}, ${counted(cases, 'case', 'cases')} and ${counted(accounts, 'account', 'accounts')}.`
    + (kept === 0 ? '' : ` ${counted(kept, 'account', 'accounts')} that other projects name ${kept === 1 ? 'stays' : 'stay'} as a name, disabled.`),
  emailTaken: (email: string) => `The address ${email} belongs to an account that is not of the demo; change that account's address or leave the demo out.`,
  needsOwner: 'Removing the demo needs DATABASE_OWNER_URL: the user who owns the tables.',
  theirWork: (cases: readonly { code: string; by: string }[]) =>
    `Nothing was removed: ${cases.slice(0, 5).map(({ code, by }) => `${code} (${by})`).join(', ')}${cases.length > 5 ? ` and ${cases.length - 5} more` : ''} in demo projects ${cases.length === 1 ? 'holds' : 'hold'} work of people who are not of the demo; save their sheets, then add --with-their-work.`,
} as const;
