import type { Transaction } from 'sequelize';

import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { UserModel } from '@/server/db/models/UserModel';
import { logProjectEvent } from '@/server/features/team/store';

import { PEOPLE, PROJECTS } from './people';
import { PERSON_KEYS, PROJECT_KEYS, type PersonKey, type ProjectKey } from './story';

export interface Scene {
  personIds: Record<PersonKey, string>;
  projectIds: Record<ProjectKey, string>;
}

interface Setting {
  newId: () => string;
  passwordHash: string;
  /** accounts and projects exist from here on */
  begin: Date;
  day: (inDays: number) => string;
  transaction: Transaction;
}

/**
 * Accounts, projects and memberships, marked as demo, with the lines in each project's log that tell of them. The administrator
 * takes no part in the story and gets a password when it is told to its end.
 */
export async function setScene({ newId, passwordHash, begin, day, transaction }: Setting): Promise<Scene> {
  const personIds = Object.fromEntries(PERSON_KEYS.map((key) => [key, newId()])) as Record<PersonKey, string>;
  const projectIds = Object.fromEntries(PROJECT_KEYS.map((key) => [key, newId()])) as Record<ProjectKey, string>;
  // the story began in the past, so the rows' own times are given and not taken from the clock
  const times = { createdAt: begin, updatedAt: begin };
  for (const key of PERSON_KEYS) {
    const { name, email, siteRole } = PEOPLE[key];
    await UserModel.create({ id: personIds[key], name, email, siteRole, passwordHash: key === 'petra' ? '' : passwordHash, isDemo: true, ...times }, { transaction, silent: true });
  }
  for (const key of PROJECT_KEYS) {
    const { members, ...settings } = PROJECTS[key];
    await ProjectModel.create({ id: projectIds[key], projectKey: await freeKey(key, transaction), ...settings, isDemo: true, createdBy: personIds.petra, ...times }, { transaction, silent: true });
    await logProjectEvent(projectIds[key], personIds.petra, begin, { format: 1, kind: 'project-created' }, transaction);
    for (const { person, role, guestForDays } of members) {
      const guestUntil = guestForDays === undefined ? null : day(guestForDays);
      await MembershipModel.create({ projectId: projectIds[key], userId: personIds[person], role, guestUntil, joinedAt: begin }, { transaction });
      await logProjectEvent(projectIds[key], personIds.petra, begin, { format: 1, kind: 'member-added', person: PEOPLE[person].name, role, guestUntil }, transaction);
    }
  }
  return { personIds, projectIds };
}

/** A real project may have the key already: the demo then takes the next free one and leaves the real one alone. */
async function freeKey(key: ProjectKey, transaction: Transaction): Promise<string> {
  for (let number = 1; ; number += 1) {
    const wanted = number === 1 ? key : `${key}${number}`;
    if ((await ProjectModel.count({ where: { projectKey: wanted }, transaction })) === 0) return wanted;
  }
}
