import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** A remark at a value, tied to the revision it was written on. */
export class CommentModel extends Model<InferAttributes<CommentModel>, InferCreationAttributes<CommentModel>> {
  declare id: string;
  declare caseId: string;
  declare target: string;
  declare targetLabel: string;
  declare revision: number;
  declare text: string;
  declare byId: string;
  declare byName: string;
  declare at: Date;
  declare resolvedById: string | null;
  declare resolvedByName: string | null;
  declare resolvedAt: Date | null;
}
export const defineComment = (sequelize: Sequelize) => CommentModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  target: { type: DataTypes.STRING(120), allowNull: false },
  targetLabel: { type: DataTypes.STRING(200), allowNull: false },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  text: { type: DataTypes.STRING(LIMITS.comment), allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  byName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
  resolvedById: { type: DataTypes.UUID, allowNull: true },
  resolvedByName: { type: DataTypes.STRING(LIMITS.personName), allowNull: true },
  resolvedAt: { type: DataTypes.DATE(3), allowNull: true },
}, { sequelize, tableName: 'comments', timestamps: false });
