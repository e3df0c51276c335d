import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { REVIEW_STEPS, type ReviewStep } from '@/shared/types/trail';

/** A step of the check-list that stands checked, and on which revision. */
export class ReviewCheckModel extends Model<InferAttributes<ReviewCheckModel>, InferCreationAttributes<ReviewCheckModel>> {
  declare caseId: string;
  declare step: ReviewStep;
  declare revision: number;
  declare byId: string;
  declare at: Date;
}
export const defineReviewCheck = (sequelize: Sequelize) => ReviewCheckModel.init({
  caseId: { type: DataTypes.UUID, primaryKey: true },
  step: { type: DataTypes.ENUM(...REVIEW_STEPS), primaryKey: true },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  byId: { type: DataTypes.UUID, allowNull: false },
  at: { type: DataTypes.DATE(3), allowNull: false },
}, { sequelize, tableName: 'review_checks', timestamps: false });
