import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import type { ProjectEvent } from '@/shared/types/projectEvent';

export class ProjectEventModel extends Model<InferAttributes<ProjectEventModel>, InferCreationAttributes<ProjectEventModel>> {
  declare id: CreationOptional<number>;
  declare projectId: string;
  declare byId: string;
  declare at: Date;
  declare kind: ProjectEvent['kind'];
  declare detail: ProjectEvent;
}
export const defineProjectEvent = (sequelize: Sequelize) => ProjectEventModel.init({
  id: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true, autoIncrement: true },
  projectId: { type: DataTypes.UUID, allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
  kind: { type: DataTypes.STRING(40), allowNull: false },
  detail: { type: DataTypes.JSON, allowNull: false },
}, { sequelize, tableName: 'project_events', timestamps: false });
