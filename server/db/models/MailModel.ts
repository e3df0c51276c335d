import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

export class MailModel extends Model<InferAttributes<MailModel>, InferCreationAttributes<MailModel>> {
  declare id: CreationOptional<number>;
  declare messageId: string;
  declare recipient: string;
  declare subject: string;
  declare text: string;
  declare link: string | null;
  declare at: Date;
}
export const defineMail = (sequelize: Sequelize) => MailModel.init({
  id: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true, autoIncrement: true },
  messageId: { type: DataTypes.UUID, allowNull: false },
  recipient: { type: DataTypes.STRING(LIMITS.email), allowNull: false },
  subject: { type: DataTypes.STRING(300), allowNull: false },
  text: { type: DataTypes.TEXT, allowNull: false },
  link: { type: DataTypes.STRING(600), allowNull: true },
  at: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'mailbox', timestamps: false });
