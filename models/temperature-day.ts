import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** Lowest and highest temperature of one local day of a nest, in °C. */
export class TemperatureDay extends Model<InferAttributes<TemperatureDay>, InferCreationAttributes<TemperatureDay>> {
  declare team_id: Buffer;
  declare temperature_id: Buffer;
  declare date: string;
  declare min_c: number;
  declare max_c: number;
}

/** Puts the model of `temperature_days` on a connection. */
export function defineTemperatureDay(sequelize: Sequelize): typeof TemperatureDay {
  class Bound extends TemperatureDay {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      temperature_id: { type: 'BINARY(16)', primaryKey: true },
      date: { type: DataTypes.STRING(10), primaryKey: true },
      min_c: { type: DataTypes.DOUBLE, allowNull: false },
      max_c: { type: DataTypes.DOUBLE, allowNull: false },
    },
    { sequelize, modelName: 'TemperatureDay', tableName: 'temperature_days', timestamps: false },
  );
}
