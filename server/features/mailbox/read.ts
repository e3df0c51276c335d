import { QueryTypes, type Sequelize } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { tokenHash } from '@/server/auth/tokens';
import { MailModel } from '@/server/db/models/MailModel';

const MOST_SHOWN = 200;

/** Addresses of the invented accounts, and hashes of the invitations into invented projects. */
async function demoMarks(db: Sequelize): Promise<{ addresses: ReadonlySet<string>; invitations: ReadonlySet<string> }> {
  const [people, invitations] = await Promise.all([
    db.query<{ email: string }>('SELECT email FROM users WHERE is_demo = 1', { type: QueryTypes.SELECT }),
    db.query<{ hash: string }>('SELECT i.token_hash AS hash FROM invitations i JOIN projects p ON p.id = i.project_id WHERE p.is_demo = 1', { type: QueryTypes.SELECT }),
  ]);
  return { addresses: new Set(people.map(({ email }) => email)), invitations: new Set(invitations.map(({ hash }) => hash)) };
}

/**
 * The local mailbox, newest first. Links in mails open accounts, so a visitor sees the mails of the invented example
 * alone; a real administrator, who set this server up without a mail server, sees all.
 */
export async function mailsFor(db: Sequelize, who: Actor | null): Promise<MailModel[]> {
  const mails = await MailModel.findAll({ order: [['id', 'DESC']], limit: MOST_SHOWN });
  if (who && who.siteRole === 'administrator' && !who.isDemo) return mails;
  const { addresses, invitations } = await demoMarks(db);
  return mails.filter(({ recipient, link }) => {
    const invited = /\/invitation\/([\w-]+)/.exec(link ?? '')?.[1];
    return invited === undefined ? addresses.has(recipient) : invitations.has(tokenHash(invited));
  });
}
