import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';
import { PROJECT_ROLES, type ProjectRole } from '@/shared/types/roles';

export class InvitationModel extends Model<InferAttributes<InvitationModel>, InferCreationAttributes<InvitationModel>> {
  declare id: string;
  declare projectId: string;
  declare email: string;
  declare role: ProjectRole;
  declare guestUntil: string | null;
  declare tokenHash: string;
  declare invitedBy: string;
  declare sentAt: Date;
  declare expiresAt: Date;
  declare acceptedAt: CreationOptional<Date | null>;
  declare withdrawnAt: CreationOptional<Date | null>;
}
export const defineInvitation = (sequelize: Sequelize) => InvitationModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  projectId: { type: DataTypes.UUID, allowNull: false },
  email: { type: DataTypes.STRING(LIMITS.email), allowNull: false },
  role: { type: DataTypes.ENUM(...PROJECT_ROLES), allowNull: false },
  guestUntil: { type: DataTypes.DATEONLY, allowNull: true },
  tokenHash: { type: DataTypes.CHAR(64), allowNull: false },
  invitedBy: { type: DataTypes.UUID, allowNull: false },
  sentAt: { type: DataTypes.DATE(3), allowNull: false },
  expiresAt: { type: DataTypes.DATE(3), allowNull: false },
  acceptedAt: { type: DataTypes.DATE(3), allowNull: true },
  withdrawnAt: { type: DataTypes.DATE(3), allowNull: true },
}, { sequelize, tableName: 'invitations', timestamps: false });
