import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';

/** A file of a case; its bytes lie on the disk under its hash. Rows are only added. */
export class AttachmentModel extends Model<InferAttributes<AttachmentModel>, InferCreationAttributes<AttachmentModel>> {
  declare id: string;
  declare caseId: string;
  declare fileName: string;
  declare mediaType: string;
  declare bytes: number;
  declare sha256: string;
  declare byId: string;
  declare byName: string;
  declare at: Date;
}
export const defineAttachment = (sequelize: Sequelize) => AttachmentModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  fileName: { type: DataTypes.STRING(LIMITS.fileName), allowNull: false },
  mediaType: { type: DataTypes.STRING(100), allowNull: false },
  bytes: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  sha256: { type: DataTypes.CHAR(64), allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  byName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'attachments', timestamps: false });
