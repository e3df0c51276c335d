import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';
import { SITE_ROLES, type SiteRole } from '@/shared/types/roles';

export const ACCOUNT_STATUSES = ['active', 'disabled'] as const;
export type AccountStatus = (typeof ACCOUNT_STATUSES)[number];

export class UserModel extends Model<InferAttributes<UserModel>, InferCreationAttributes<UserModel>> {
  declare id: string;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare siteRole: CreationOptional<SiteRole>;
  declare status: CreationOptional<AccountStatus>;
  declare isDemo: CreationOptional<boolean>;
  declare sessionEpoch: CreationOptional<number>;
  declare lastSignInAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}
export const defineUser = (sequelize: Sequelize) => UserModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  email: { type: DataTypes.STRING(LIMITS.email), allowNull: false },
  name: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  passwordHash: { type: DataTypes.STRING(100), allowNull: false },
  siteRole: { type: DataTypes.ENUM(...SITE_ROLES), allowNull: false, defaultValue: 'member' },
  status: { type: DataTypes.ENUM(...ACCOUNT_STATUSES), allowNull: false, defaultValue: 'active' },
  isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  sessionEpoch: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
  lastSignInAt: { type: DataTypes.DATE(3), allowNull: true },
  createdAt: { type: DataTypes.DATE(3), allowNull: false },
  updatedAt: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'users' });
