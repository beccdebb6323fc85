import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One cell of a final reading decided by a reviewer, with the reason and the mark it replaced. */
export class Settlement extends Model<InferAttributes<Settlement>, InferCreationAttributes<Settlement>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare reading_id: Buffer;
  declare version: number;
  declare position: number;
  declare q: number;
  declare r: number;
  declare state: string;
  declare reason: string;
  declare mark_op_id: Buffer | null;
  declare pick: string | null;
  declare actor_id: Buffer;
  declare created_at: Date;
}

/** Puts the model of `settlements` on a connection. */
export function defineSettlement(sequelize: Sequelize): typeof Settlement {
  class Bound extends Settlement {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      reading_id: { type: 'BINARY(16)', allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      q: { type: DataTypes.SMALLINT, allowNull: false },
      r: { type: DataTypes.SMALLINT, allowNull: false },
      state: { type: DataTypes.STRING(32), allowNull: false },
      reason: { type: DataTypes.TEXT('medium'), allowNull: false },
      mark_op_id: { type: 'BINARY(16)', allowNull: true },
      pick: { type: DataTypes.STRING(32), allowNull: true },
      actor_id: { type: 'BINARY(16)', allowNull: false },
      created_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'Settlement', tableName: 'settlements', timestamps: false },
  );
}
