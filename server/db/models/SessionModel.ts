import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

/** The name by which the session store finds the model. */
export const SESSION_MODEL = 'Session';

export class SessionModel extends Model<InferAttributes<SessionModel>, InferCreationAttributes<SessionModel>> {
  declare sid: string;
  declare expires: Date | null;
  declare data: string | null;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}
export const defineSession = (sequelize: Sequelize) => SessionModel.init({
  sid: { type: DataTypes.STRING(64), primaryKey: true },
  expires: { type: DataTypes.DATE(3), allowNull: true },
  data: { type: DataTypes.TEXT, allowNull: true },
  createdAt: DataTypes.DATE(3),
  updatedAt: DataTypes.DATE(3),
}, { sequelize, modelName: SESSION_MODEL, tableName: 'sessions' });
