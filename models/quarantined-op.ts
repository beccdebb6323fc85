import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** Operations held but not applied: parked until what they need arrives, impossible, or in conflict. */
export class QuarantinedOp extends Model<InferAttributes<QuarantinedOp>, InferCreationAttributes<QuarantinedOp>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare digest: Buffer;
  declare op_id: Buffer | null;
  declare state: string;
  declare code: string;
  declare raw: string;
  declare missing: string;
  declare actor_id: Buffer;
  declare received_at: Date;
}

/** Puts the model of `quarantined_ops` on a connection. */
export function defineQuarantinedOp(sequelize: Sequelize): typeof QuarantinedOp {
  class Bound extends QuarantinedOp {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      digest: { type: 'BINARY(32)', allowNull: false },
      op_id: { type: 'BINARY(16)', allowNull: true },
      state: { type: DataTypes.STRING(32), allowNull: false },
      code: { type: DataTypes.STRING(32), allowNull: false },
      raw: { type: DataTypes.TEXT('long'), allowNull: false },
      missing: { type: DataTypes.TEXT, allowNull: false },
      actor_id: { type: 'BINARY(16)', allowNull: false },
      received_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'QuarantinedOp', tableName: 'quarantined_ops', timestamps: false },
  );
}
