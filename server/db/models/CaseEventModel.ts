import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** What happened to a case, in words. Rows are only added. */
export class CaseEventModel extends Model<InferAttributes<CaseEventModel>, InferCreationAttributes<CaseEventModel>> {
  declare id: CreationOptional<number>;
  declare caseId: string;
  declare at: Date;
  declare byId: string;
  declare byName: string;
  declare kind: string;
  declare text: string;
  declare format: CreationOptional<number>;
}
export const defineCaseEvent = (sequelize: Sequelize) => CaseEventModel.init({
  id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  byName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  kind: { type: DataTypes.STRING(40), allowNull: false },
  text: { type: DataTypes.STRING(2400), allowNull: false },
  format: { type: DataTypes.TINYINT.UNSIGNED, allowNull: false, defaultValue: 1 },
}, { sequelize, tableName: 'case_events', timestamps: false });
