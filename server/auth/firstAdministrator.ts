import { randomUUID } from 'node:crypto';
import { z } from 'zod';

import { defineModels } from '@/server/db/models';
import { UserModel } from '@/server/db/models/UserModel';
import { openDatabase } from '@/server/db/sequelize';
import { SettingError } from '@/server/env';
import { email, password, text } from '@/shared/contracts/common';
import { LIMITS } from '@/shared/limits';
import type { Passwords } from './passwords';

const schema = z.object({ email, name: text(LIMITS.personName), password });

/**
 * Makes a site administrator from the command line: the first one, who invites everybody else. An account with that
 * address becomes administrator, active, with this password, which also lets a locked-out site in again.
 * @returns what was done, in one sentence
 */
export async function createAdministrator(databaseUrl: string, passwords: Passwords, given: { email: string; name: string; password: string }): Promise<string> {
  const parsed = schema.safeParse(given);
  if (!parsed.success) {
    const issue = parsed.error.issues[0];
    throw new SettingError(`--${String(issue?.path[0])}: ${issue?.message ?? 'cannot be used.'}`);
  }
  const db = openDatabase(databaseUrl, 1);
  try {
    defineModels(db);
    const passwordHash = await passwords.hash(parsed.data.password);
    const found = await UserModel.findOne({ where: { email: parsed.data.email } });
    if (found) {
      await found.update({ siteRole: 'administrator', status: 'active', name: parsed.data.name, passwordHash, sessionEpoch: found.sessionEpoch + 1 });
      return `The account ${found.email} is now site administrator, with the new password.`;
    }
    const now = new Date();
    await UserModel.create({ id: randomUUID(), email: parsed.data.email, name: parsed.data.name, passwordHash, siteRole: 'administrator', createdAt: now, updatedAt: now });
    return `The site administrator ${parsed.data.email} can sign in now.`;
  } finally {
    await db.close();
  }
}
