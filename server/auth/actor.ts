import { QueryTypes, type Sequelize } from 'sequelize';

import type { ProjectRole, SiteRole } from '@/shared/types/roles';

export interface ActorProject {
  id: string;
  key: string;
  name: string;
  role: ProjectRole;
  /** the last day (UTC) of a guest; null = a member without an end */
  guestUntil: string | null;
}

/** Who is asking, as the database says at this request; never kept for the next one. */
export interface Actor {
  id: string;
  name: string;
  email: string;
  siteRole: SiteRole;
  isDemo: boolean;
  projects: readonly ActorProject[];
  projectIds: readonly string[];
  /** null = not in that project (or no longer) */
  roleIn: (projectId: string) => ProjectRole | null;
}

export function makeActor(person: Omit<Actor, 'projectIds' | 'roleIn'>): Actor {
  return {
    ...person,
    projectIds: person.projects.map(({ id }) => id),
    roleIn: (projectId) => person.projects.find(({ id }) => id === projectId)?.role ?? null,
  };
}

/** The calendar day in UTC, by which guests end and due dates count. */
export const utcDay = (at: Date): string => at.toISOString().slice(0, 10);

interface Row {
  id: string; name: string; email: string; site_role: SiteRole; is_demo: number; session_epoch: number;
  project_id: string | null; project_key: string; project_name: string; role: ProjectRole; guest_until: string | null;
}

/**
 * Reads a person with the projects that are open to them today; an ended guest's project is simply not there.
 * @returns null when the account is gone or disabled, or every session was ended after `epoch` was handed out
 */
export async function readActor(db: Sequelize, userId: string, epoch: number, now: Date): Promise<Actor | null> {
  const rows = await db.query<Row>(
    `SELECT u.id, u.name, u.email, u.site_role, u.is_demo, u.session_epoch, p.id AS project_id, p.project_key, p.name AS project_name, m.role,
            DATE_FORMAT(m.guest_until, '%Y-%m-%d') AS guest_until
       FROM users u
       LEFT JOIN memberships m ON m.user_id = u.id AND (m.guest_until IS NULL OR m.guest_until >= :today)
       LEFT JOIN projects p ON p.id = m.project_id
      WHERE u.id = :userId AND u.status = 'active'
      ORDER BY p.name, p.id`,
    { replacements: { userId, today: utcDay(now) }, type: QueryTypes.SELECT });
  const [first] = rows;
  if (!first || first.session_epoch !== epoch) return null;
  return makeActor({
    id: first.id, name: first.name, email: first.email, siteRole: first.site_role, isDemo: first.is_demo === 1,
    projects: rows.flatMap((row) => (row.project_id === null ? [] : [{
      id: row.project_id, key: row.project_key, name: row.project_name, role: row.role, guestUntil: row.guest_until,
    }])),
  });
}
