import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** A save, whole. `content` and `trail` are canonical JSON text: the hash is over these very characters. */
export class CaseRevisionModel extends Model<InferAttributes<CaseRevisionModel>, InferCreationAttributes<CaseRevisionModel>> {
  declare caseId: string;
  declare number: number;
  declare content: string;
  declare trail: string;
  declare contentHash: string;
  declare engineVersion: string;
  declare savedById: string;
  declare savedByName: string;
  declare savedAt: Date;
  declare reason: string;
  declare changes: number;
}
export const defineCaseRevision = (sequelize: Sequelize) => CaseRevisionModel.init({
  caseId: { type: DataTypes.UUID, primaryKey: true },
  number: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true },
  content: { type: DataTypes.TEXT('long'), allowNull: false },
  trail: { type: DataTypes.TEXT('long'), allowNull: false },
  contentHash: { type: DataTypes.CHAR(64), allowNull: false },
  engineVersion: { type: DataTypes.STRING(40), allowNull: false },
  savedById: { type: DataTypes.UUID, allowNull: false },
  savedByName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  savedAt: { type: DataTypes.DATE(3), allowNull: false },
  reason: { type: DataTypes.STRING(LIMITS.note), allowNull: false },
  changes: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
}, { sequelize, tableName: 'case_revisions', timestamps: false });
