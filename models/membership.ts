import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** What a person is in a team. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare team_id: Buffer;
  declare user_id: Buffer;
  declare role: string;
  /** Set when the person left; what they recorded still stands under their name. */
  declare ended_at: CreationOptional<Date | null>;
}

/** Puts the model of `memberships` on a connection. */
export function defineMembership(sequelize: Sequelize): typeof Membership {
  class Bound extends Membership {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      user_id: { type: 'BINARY(16)', primaryKey: true },
      role: { type: DataTypes.STRING(32), allowNull: false },
      ended_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'Membership', tableName: 'memberships', timestamps: false },
  );
}
