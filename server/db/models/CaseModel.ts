import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { LIMITS } from '@/shared/limits';
import { GRADES, type Grade } from '@/shared/types/answer';
import { CASE_STATES, type CaseState } from '@/shared/types/case';

/** One row a case: what the log lists, and where its review stands. */
export class CaseModel extends Model<InferAttributes<CaseModel>, InferCreationAttributes<CaseModel>> {
  declare id: string;
  declare projectId: string;
  declare number: number;
  declare code: string;
  declare codeOrder: string;
  declare authorId: string;
  declare question: string;
  declare state: CaseState;
  declare version: number;
  declare revision: number;
  declare contentHash: string;
  declare firstSubmittedRevision: number | null;
  declare submittedRevision: number | null;
  declare submittedAt: Date | null;
  declare compound: string;
  declare batch: string;
  declare notebook: string;
  declare keyLabel: string | null;
  declare keyJText: string | null;
  declare answerGrade: Grade;
  declare answerText: string;
  declare answerJudged: boolean;
  declare untested: number;
  declare reviewerId: string | null;
  declare claimedAt: Date | null;
  declare heldUntil: Date | null;
  declare dueOn: string | null;
  declare supersedesId: string | null;
  declare supersededById: string | null;
  declare createdAt: Date;
  declare changedAt: Date;
  declare changedById: string;
  declare searchText: string;
}
export const defineCase = (sequelize: Sequelize) => CaseModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  projectId: { type: DataTypes.UUID, allowNull: false },
  number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  code: { type: DataTypes.STRING(24), allowNull: false },
  codeOrder: { type: DataTypes.STRING(24), allowNull: false },
  authorId: { type: DataTypes.UUID, allowNull: false },
  question: { type: DataTypes.STRING(LIMITS.question), allowNull: false },
  state: { type: DataTypes.ENUM(...CASE_STATES), allowNull: false },
  version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  contentHash: { type: DataTypes.CHAR(64), allowNull: false },
  firstSubmittedRevision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
  submittedRevision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
  submittedAt: { type: DataTypes.DATE(3), allowNull: true },
  compound: { type: DataTypes.STRING(LIMITS.compoundName), allowNull: false },
  batch: { type: DataTypes.STRING(LIMITS.batch), allowNull: false },
  notebook: { type: DataTypes.STRING(LIMITS.notebook), allowNull: false },
  keyLabel: { type: DataTypes.STRING(80), allowNull: true },
  keyJText: { type: DataTypes.STRING(80), allowNull: true },
  answerGrade: { type: DataTypes.ENUM(...GRADES), allowNull: false },
  answerText: { type: DataTypes.STRING(600), allowNull: false },
  answerJudged: { type: DataTypes.BOOLEAN, allowNull: false },
  untested: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  reviewerId: { type: DataTypes.UUID, allowNull: true },
  claimedAt: { type: DataTypes.DATE(3), allowNull: true },
  heldUntil: { type: DataTypes.DATE(3), allowNull: true },
  dueOn: { type: DataTypes.DATEONLY, allowNull: true },
  supersedesId: { type: DataTypes.UUID, allowNull: true },
  supersededById: { type: DataTypes.UUID, allowNull: true },
  createdAt: { type: DataTypes.DATE(3), allowNull: false },
  changedAt: { type: DataTypes.DATE(3), allowNull: false },
  changedById: { type: DataTypes.UUID, allowNull: false },
  searchText: { type: DataTypes.TEXT('medium'), allowNull: false },
}, { sequelize, tableName: 'cases', timestamps: false });
