import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One complete set of cell states by one person, or the final reading settled from one. */
export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare nest_id: Buffer;
  declare visit_id: Buffer;
  declare kind: string;
  declare source: string;
  declare aid: string | null;
  declare light: string | null;
  declare opened_by: Buffer;
  declare opened_at: Date;
  declare opened_at_text: string;
  declare submitted_at: Date | null;
  declare based_on: Buffer | null;
  declare base_seq: number | null;
  declare version: number | null;
  declare locked_version: number | null;
}

/** Puts the model of `readings` on a connection. */
export function defineReading(sequelize: Sequelize): typeof Reading {
  class Bound extends Reading {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      nest_id: { type: 'BINARY(16)', allowNull: false },
      visit_id: { type: 'BINARY(16)', allowNull: false },
      kind: { type: DataTypes.STRING(32), allowNull: false },
      source: { type: DataTypes.STRING(32), allowNull: false },
      aid: { type: DataTypes.STRING(200), allowNull: true },
      light: { type: DataTypes.STRING(200), allowNull: true },
      opened_by: { type: 'BINARY(16)', allowNull: false },
      opened_at: { type: DataTypes.DATE(3), allowNull: false },
      opened_at_text: { type: DataTypes.STRING(200), allowNull: false },
      submitted_at: { type: DataTypes.DATE(3), allowNull: true },
      based_on: { type: 'BINARY(16)', allowNull: true },
      base_seq: { type: DataTypes.BIGINT, allowNull: true },
      version: { type: DataTypes.INTEGER, allowNull: true },
      locked_version: { type: DataTypes.INTEGER, allowNull: true },
    },
    { sequelize, modelName: 'Reading', tableName: 'readings', timestamps: false },
  );
}
