import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** The log: every operation a team ever sent, once, in commit order. */
export class Op extends Model<InferAttributes<Op>, InferCreationAttributes<Op>> {
  declare team_id: Buffer;
  declare op_id: Buffer;
  declare seq: number;
  declare kind: string;
  declare nest_id: Buffer | null;
  declare visit_id: Buffer | null;
  declare reading_id: Buffer | null;
  declare actor_id: Buffer;
  declare device_id: Buffer | null;
  declare hlc: string;
  declare op: string;
  declare body_hash: Buffer;
  declare flags: string;
  declare received_at: Date;
}

/** Puts the model of `ops` on a connection. */
export function defineOp(sequelize: Sequelize): typeof Op {
  class Bound extends Op {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      op_id: { type: 'BINARY(16)', primaryKey: true },
      seq: { type: DataTypes.BIGINT, allowNull: false },
      kind: { type: DataTypes.STRING(32), allowNull: false },
      nest_id: { type: 'BINARY(16)', allowNull: true },
      visit_id: { type: 'BINARY(16)', allowNull: true },
      reading_id: { type: 'BINARY(16)', allowNull: true },
      actor_id: { type: 'BINARY(16)', allowNull: false },
      device_id: { type: 'BINARY(16)', allowNull: true },
      hlc: { type: DataTypes.STRING(32), allowNull: false },
      op: { type: DataTypes.TEXT('long'), allowNull: false },
      body_hash: { type: 'BINARY(32)', allowNull: false },
      flags: { type: DataTypes.STRING(255), allowNull: false },
      received_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'Op', tableName: 'ops', timestamps: false },
  );
}
