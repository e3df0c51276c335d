import type { Deps } from '@/server/deps';
import { demoIsLoaded } from '@/server/features/account/demo';
import { Problem } from '@/server/http/problems';
import { route, type Route } from '@/server/http/route';
import { mailboxResponse } from '@/shared/contracts/team';
import { problemText } from '@/shared/text/problems';
import { mailsFor } from './read';

export const mailboxRoutes = (deps: Deps): Route[] => [
  route({ method: 'get', path: '/api/mailbox', access: 'optional', summary: 'What the local mailbox has received; only while the demo is loaded', response: mailboxResponse }, async ({ who }) => {
    // Links in these mails open accounts: outside the demo nobody may read them here.
    if (!await demoIsLoaded()) throw new Problem('not-found', problemText.noSuchPath);
    const mails = await mailsFor(deps.db, who);
    return { messages: mails.map(({ messageId, recipient, subject, text, link, at }) => ({ id: messageId, to: recipient, subject, text, at: at.toISOString(), link })) };
  }),
];
