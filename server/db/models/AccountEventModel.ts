import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

export class AccountEventModel extends Model<InferAttributes<AccountEventModel>, InferCreationAttributes<AccountEventModel>> {
  declare id: CreationOptional<number>;
  declare userId: string;
  declare byId: string;
  declare at: Date;
  declare kind: string;
  declare detail: Record<string, string>;
}
export const defineAccountEvent = (sequelize: Sequelize) => AccountEventModel.init({
  id: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true, autoIncrement: true },
  userId: { type: DataTypes.UUID, allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
  kind: { type: DataTypes.STRING(40), allowNull: false },
  detail: { type: DataTypes.JSON, allowNull: false },
}, { sequelize, tableName: 'account_events', timestamps: false });
