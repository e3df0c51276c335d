import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** A tag of a case. */
export class CaseTagModel extends Model<InferAttributes<CaseTagModel>, InferCreationAttributes<CaseTagModel>> {
  declare caseId: string;
  declare tag: string;
  declare projectId: string;
}
export const defineCaseTag = (sequelize: Sequelize) => CaseTagModel.init({
  caseId: { type: DataTypes.UUID, primaryKey: true },
  tag: { type: DataTypes.STRING(LIMITS.tag), primaryKey: true },
  projectId: { type: DataTypes.UUID, allowNull: false },
}, { sequelize, tableName: 'case_tags', timestamps: false });
