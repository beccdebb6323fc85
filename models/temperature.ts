import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One temperature record of a nest: a file or days noted by hand, as it came, and who took it out of force. */
export class Temperature extends Model<InferAttributes<Temperature>, InferCreationAttributes<Temperature>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare nest_id: Buffer;
  declare kind: 'logger' | 'daily';
  declare source: 'file' | 'hand';
  declare file_name: string | null;
  declare raw: string;
  declare raw_hash: Buffer;
  declare answers: string;
  declare size: number;
  declare from_at: Date;
  declare to_at: Date;
  declare kept_by: Buffer;
  declare kept_at: Date;
  declare removed_by: Buffer | null;
  declare removed_at: Date | null;
  declare removed_reason: string | null;
}

/** Puts the model of `temperatures` on a connection. */
export function defineTemperature(sequelize: Sequelize): typeof Temperature {
  class Bound extends Temperature {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      nest_id: { type: 'BINARY(16)', allowNull: false },
      kind: { type: DataTypes.STRING(32), allowNull: false },
      source: { type: DataTypes.STRING(32), allowNull: false },
      file_name: { type: DataTypes.STRING(200), allowNull: true },
      raw: { type: DataTypes.TEXT('long'), allowNull: false },
      raw_hash: { type: 'BINARY(32)', allowNull: false },
      answers: { type: DataTypes.TEXT('long'), allowNull: false },
      size: { type: DataTypes.INTEGER, allowNull: false },
      from_at: { type: DataTypes.DATE(3), allowNull: false },
      to_at: { type: DataTypes.DATE(3), allowNull: false },
      kept_by: { type: 'BINARY(16)', allowNull: false },
      kept_at: { type: DataTypes.DATE(3), allowNull: false },
      removed_by: { type: 'BINARY(16)', allowNull: true },
      removed_at: { type: DataTypes.DATE(3), allowNull: true },
      removed_reason: { type: DataTypes.TEXT('medium'), allowNull: true },
    },
    { sequelize, modelName: 'Temperature', tableName: 'temperatures', timestamps: false },
  );
}
