import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A person who has taken on the second reading of a visit. */
export class ReviewClaim extends Model<InferAttributes<ReviewClaim>, InferCreationAttributes<ReviewClaim>> {
  declare team_id: Buffer;
  declare visit_id: Buffer;
  declare user_id: Buffer;
  declare claimed_at: Date;
}

/** Puts the model of `review_claims` on a connection. */
export function defineReviewClaim(sequelize: Sequelize): typeof ReviewClaim {
  class Bound extends ReviewClaim {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      visit_id: { type: 'BINARY(16)', primaryKey: true },
      user_id: { type: 'BINARY(16)', allowNull: false },
      claimed_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'ReviewClaim', tableName: 'review_claims', timestamps: false },
  );
}
