import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

export const QUERY_SENDERS = ['reviewer', 'author'] as const;
export type QuerySender = (typeof QUERY_SENDERS)[number];

/** A message in the thread of a query. Rows are only added. */
export class QueryMessageModel extends Model<InferAttributes<QueryMessageModel>, InferCreationAttributes<QueryMessageModel>> {
  declare id: CreationOptional<number>;
  declare queryId: string;
  declare sender: QuerySender;
  declare text: string;
  declare byId: string;
  declare byName: string;
  declare at: Date;
}
export const defineQueryMessage = (sequelize: Sequelize) => QueryMessageModel.init({
  id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
  queryId: { type: DataTypes.UUID, allowNull: false },
  sender: { type: DataTypes.ENUM(...QUERY_SENDERS), allowNull: false },
  text: { type: DataTypes.STRING(LIMITS.query), allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  byName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'query_messages', timestamps: false });
