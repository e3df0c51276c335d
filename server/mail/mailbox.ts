import type { Sequelize } from 'sequelize';

import { MailModel } from '@/server/db/models/MailModel';
import type { Letter } from './mailer';

/** The newest are kept; a page nobody clears must not grow for ever. */
const MOST_KEPT = 200;

/** Keeps a mail in the table that the mailbox page of the demo shows. */
export const keepLetter = ({ db, now, newId }: { db: Sequelize; now: () => Date; newId: () => string }) => async (letter: Letter): Promise<void> => {
  const link = /https?:\/\/\S+/.exec(letter.text)?.[0] ?? null; // each letter carries one address, the one to open
  const kept = await MailModel.create({ messageId: newId(), recipient: letter.to, subject: letter.subject, text: letter.text, link, at: now() });
  if (kept.id > MOST_KEPT) await db.query('DELETE FROM mailbox WHERE id <= :oldest', { replacements: { oldest: kept.id - MOST_KEPT } });
};
