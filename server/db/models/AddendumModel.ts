import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** Signed text added to a signed case. Rows are only added. */
export class AddendumModel extends Model<InferAttributes<AddendumModel>, InferCreationAttributes<AddendumModel>> {
  declare id: string;
  declare caseId: string;
  declare number: number;
  declare revision: number;
  declare text: string;
  declare byId: string;
  declare byName: string;
  declare at: Date;
  declare previousHash: string;
  declare hash: string;
}
export const defineAddendum = (sequelize: Sequelize) => AddendumModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  text: { type: DataTypes.STRING(LIMITS.query), allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  byName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
  previousHash: { type: DataTypes.CHAR(64), allowNull: false },
  hash: { type: DataTypes.CHAR(64), allowNull: false },
}, { sequelize, tableName: 'addenda', timestamps: false });
