import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize';

import { REVIEW_STEPS, type ReviewStep } from '@/shared/types/trail';

export const QUERY_STATES = ['open', 'answered', 'closed'] as const;
export type QueryState = (typeof QUERY_STATES)[number];

/** A question of a reviewer, pinned to a step of the trail. */
export class ReviewQueryModel extends Model<InferAttributes<ReviewQueryModel>, InferCreationAttributes<ReviewQueryModel>> {
  declare id: string;
  declare caseId: string;
  declare number: number;
  declare step: ReviewStep;
  declare stepKey: string | null;
  declare state: QueryState;
  declare revision: number;
  declare openedById: string;
  declare openedAt: Date;
  declare closedById: string | null;
  declare closedAt: Date | null;
}
export const defineReviewQuery = (sequelize: Sequelize) => ReviewQueryModel.init({
  id: { type: DataTypes.UUID, primaryKey: true },
  caseId: { type: DataTypes.UUID, allowNull: false },
  number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  step: { type: DataTypes.ENUM(...REVIEW_STEPS), allowNull: false },
  stepKey: { type: DataTypes.STRING(120), allowNull: true },
  state: { type: DataTypes.ENUM(...QUERY_STATES), allowNull: false },
  revision: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  openedById: { type: DataTypes.UUID, allowNull: false },
  openedAt: { type: DataTypes.DATE(3), allowNull: false },
  closedById: { type: DataTypes.UUID, allowNull: true },
  closedAt: { type: DataTypes.DATE(3), allowNull: true },
}, { sequelize, tableName: 'review_queries', timestamps: false });
