import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

export class ProjectModel extends Model<InferAttributes<ProjectModel>, InferCreationAttributes<ProjectModel>> {
  declare id: string;
  declare projectKey: string;
  declare name: string;
  declare notebookPattern: CreationOptional<string>;
  declare claimHours: CreationOptional<number>;
  declare reviewDays: CreationOptional<number>;
  declare peerReview: CreationOptional<boolean>;
  declare nextCaseNumber: CreationOptional<number>;
  declare isDemo: CreationOptional<boolean>;
  declare createdBy: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}
export const defineProject = (sequelize: Sequelize) => ProjectModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  projectKey: { type: DataTypes.STRING(LIMITS.projectKeyMax), allowNull: false },
  name: { type: DataTypes.STRING(LIMITS.projectName), allowNull: false },
  notebookPattern: { type: DataTypes.STRING(LIMITS.notebook), allowNull: false, defaultValue: '' },
  claimHours: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false, defaultValue: 24 },
  reviewDays: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false, defaultValue: 7 },
  peerReview: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  nextCaseNumber: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 1 },
  isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  createdBy: { type: DataTypes.UUID, allowNull: false },
  createdAt: { type: DataTypes.DATE(3), allowNull: false },
  updatedAt: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'projects' });
