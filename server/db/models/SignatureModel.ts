import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';
import { SIGNATURE_MEANINGS, type SignatureMeaning } from '@/shared/types/roles';

/** Who signed what, with which meaning. Rows are only added. */
export class SignatureModel extends Model<InferAttributes<SignatureModel>, InferCreationAttributes<SignatureModel>> {
  declare id: string;
  declare caseId: string;
  declare revision: number;
  declare meaning: SignatureMeaning;
  declare signerId: string;
  declare signerName: string;
  declare signedAt: Date;
  declare contentHash: string;
  declare recordHash: string;
}
export const defineSignature = (sequelize: Sequelize) => SignatureModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  meaning: { type: DataTypes.ENUM(...SIGNATURE_MEANINGS), allowNull: false },
  signerId: { type: DataTypes.UUID, allowNull: false },
  signerName: { type: DataTypes.STRING(LIMITS.personName), allowNull: false },
  signedAt: { type: DataTypes.DATE(3), allowNull: false },
  contentHash: { type: DataTypes.CHAR(64), allowNull: false },
  recordHash: { type: DataTypes.CHAR(64), allowNull: false },
}, { sequelize, tableName: 'signatures', timestamps: false });
