import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

import { InvitationModel } from '@/server/db/models/InvitationModel';
import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectEventModel } from '@/server/db/models/ProjectEventModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import type { ProjectEvent } from '@/shared/types/projectEvent';
import type { ProjectRole } from '@/shared/types/roles';

const LOG_LINES = 100;

export interface MemberRow {
  userId: string; name: string; email: string; role: ProjectRole; guestUntil: string | null; joinedAt: Date;
  /** can still sign in */
  isActive: boolean;
}

/** Adds a line to a project's log, in the transaction of what it tells. */
export const logProjectEvent = (projectId: string, byId: string, at: Date, detail: ProjectEvent, transaction: Transaction) =>
  ProjectEventModel.create({ projectId, byId, at, kind: detail.kind, detail }, { transaction });

/** Holds the project's row, so that two changes of its people come one after the other. */
export const lockProject = (id: string, transaction: Transaction) => ProjectModel.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });

export async function membersOf(db: Sequelize, projectId: string, transaction: Transaction | null = null): Promise<MemberRow[]> {
  const rows = await db.query<Omit<MemberRow, 'isActive'> & { isActive: number }>(
    `SELECT m.user_id AS userId, u.name, u.email, m.role, DATE_FORMAT(m.guest_until, '%Y-%m-%d') AS guestUntil, m.joined_at AS joinedAt, u.status = 'active' AS isActive
       FROM memberships m JOIN users u ON u.id = m.user_id
      WHERE m.project_id = :projectId
      ORDER BY FIELD(m.role, 'lead', 'reviewer', 'chemist', 'reader'), u.name, u.id`,
    { replacements: { projectId }, type: QueryTypes.SELECT, transaction });
  return rows.map((row) => ({ ...row, isActive: row.isActive === 1 }));
}

/** Leads who can still act; a lead is never a guest. */
export const activeLeads = (members: readonly MemberRow[]): MemberRow[] => members.filter(({ role, isActive }) => role === 'lead' && isActive);

export async function openInvitations(db: Sequelize, projectId: string, now: Date) {
  return db.query<{ id: string; email: string; role: ProjectRole; guestUntil: string | null; invitedBy: string; sentAt: Date; expiresAt: Date }>(
    `SELECT i.id, i.email, i.role, DATE_FORMAT(i.guest_until, '%Y-%m-%d') AS guestUntil, u.name AS invitedBy, i.sent_at AS sentAt, i.expires_at AS expiresAt
       FROM invitations i JOIN users u ON u.id = i.invited_by
      WHERE i.project_id = :projectId AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL AND i.expires_at > :now
      ORDER BY i.sent_at DESC, i.id`,
    { replacements: { projectId, now }, type: QueryTypes.SELECT });
}

/** Takes back what is still open for this address, so that one invitation stands at a time. */
export const withdrawOpen = (projectId: string, email: string, at: Date, transaction: Transaction) =>
  InvitationModel.update({ withdrawnAt: at }, { where: { projectId, email, acceptedAt: null, withdrawnAt: null }, transaction });

export async function projectLog(db: Sequelize, projectId: string) {
  return db.query<{ at: Date; by: string; detail: ProjectEvent | string }>(
    `SELECT e.at, u.name AS \`by\`, e.detail FROM project_events e JOIN users u ON u.id = e.by_id
      WHERE e.project_id = :projectId ORDER BY e.id DESC LIMIT ${LOG_LINES}`,
    { replacements: { projectId }, type: QueryTypes.SELECT });
}

/** Cases of each project, from the counters that the cases keep. */
export async function caseCounts(db: Sequelize): Promise<ReadonlyMap<string, number>> {
  const rows = await db.query<{ projectId: string; n: number | string }>('SELECT project_id AS projectId, SUM(n) AS n FROM case_counts GROUP BY project_id', { type: QueryTypes.SELECT });
  return new Map(rows.map(({ projectId, n }) => [projectId, Number(n)]));
}

/** Ids of the projects that somebody who can sign in leads. */
export async function ledProjects(db: Sequelize): Promise<ReadonlySet<string>> {
  const rows = await db.query<{ id: string }>("SELECT DISTINCT m.project_id AS id FROM memberships m JOIN users u ON u.id = m.user_id WHERE m.role = 'lead' AND u.status = 'active'", { type: QueryTypes.SELECT });
  return new Set(rows.map(({ id }) => id));
}

export const membership = (projectId: string, userId: string, transaction: Transaction) =>
  MembershipModel.findOne({ where: { projectId, userId }, transaction, lock: transaction.LOCK.UPDATE });
