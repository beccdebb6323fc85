import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** Stage durations of one taxon under one settings version, with trust and source. */
export class DurationSet extends Model<InferAttributes<DurationSet>, InferCreationAttributes<DurationSet>> {
  declare team_id: Buffer;
  declare version: number;
  declare taxon: string;
  declare egg_days: number;
  declare larva_days: number;
  declare capped_days: number;
  declare reference_c: number;
  declare trust: string;
  declare source: string;
}

/** Puts the model of `duration_sets` on a connection. */
export function defineDurationSet(sequelize: Sequelize): typeof DurationSet {
  class Bound extends DurationSet {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      taxon: { type: DataTypes.STRING(200), primaryKey: true },
      egg_days: { type: DataTypes.DOUBLE, allowNull: false },
      larva_days: { type: DataTypes.DOUBLE, allowNull: false },
      capped_days: { type: DataTypes.DOUBLE, allowNull: false },
      reference_c: { type: DataTypes.DOUBLE, allowNull: false },
      trust: { type: DataTypes.STRING(32), allowNull: false },
      source: { type: DataTypes.STRING(200), allowNull: false },
    },
    { sequelize, modelName: 'DurationSet', tableName: 'duration_sets', timestamps: false },
  );
}
