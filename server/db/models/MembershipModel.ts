import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { PROJECT_ROLES, type ProjectRole } from '@/shared/types/roles';

export class MembershipModel extends Model<InferAttributes<MembershipModel>, InferCreationAttributes<MembershipModel>> {
  declare projectId: string;
  declare userId: string;
  declare role: ProjectRole;
  declare guestUntil: string | null;
  declare joinedAt: Date;
}
export const defineMembership = (sequelize: Sequelize) => MembershipModel.init({
  projectId: { type: DataTypes.UUID, primaryKey: true },
  userId: { type: DataTypes.UUID, primaryKey: true },
  role: { type: DataTypes.ENUM(...PROJECT_ROLES), allowNull: false },
  guestUntil: { type: DataTypes.DATEONLY, allowNull: true },
  joinedAt: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'memberships', timestamps: false });
