import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

export class PasswordResetModel extends Model<InferAttributes<PasswordResetModel>, InferCreationAttributes<PasswordResetModel>> {
  declare id: string;
  declare userId: string;
  declare tokenHash: string;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}
export const definePasswordReset = (sequelize: Sequelize) => PasswordResetModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  userId: { type: DataTypes.UUID, allowNull: false },
  tokenHash: { type: DataTypes.CHAR(64), allowNull: false },
  createdAt: { type: DataTypes.DATE(3), allowNull: false },
  expiresAt: { type: DataTypes.DATE(3), allowNull: false },
  usedAt: { type: DataTypes.DATE(3), allowNull: true },
}, { sequelize, tableName: 'password_resets', timestamps: false });
