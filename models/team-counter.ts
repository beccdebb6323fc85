import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** The row every writer of a team locks first: it gives the gapless order of commits. */
export class TeamCounter extends Model<InferAttributes<TeamCounter>, InferCreationAttributes<TeamCounter>> {
  declare team_id: Buffer;
  declare seq: number;
  declare safe_seq: number;
  declare audit_seq: number;
  declare audit_hash: Buffer;
}

/** Puts the model of `team_counters` on a connection. */
export function defineTeamCounter(sequelize: Sequelize): typeof TeamCounter {
  class Bound extends TeamCounter {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      seq: { type: DataTypes.BIGINT, allowNull: false },
      safe_seq: { type: DataTypes.BIGINT, allowNull: false },
      audit_seq: { type: DataTypes.BIGINT, allowNull: false },
      audit_hash: { type: 'BINARY(32)', allowNull: false },
    },
    { sequelize, modelName: 'TeamCounter', tableName: 'team_counters', timestamps: false },
  );
}
