import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One measurement of a logger, as read from its file; in °C. */
export class TemperatureReading extends Model<
  InferAttributes<TemperatureReading>,
  InferCreationAttributes<TemperatureReading>
> {
  declare team_id: Buffer;
  declare temperature_id: Buffer;
  declare at: Date;
  declare celsius: number;
}

/** Puts the model of `temperature_readings` on a connection. */
export function defineTemperatureReading(sequelize: Sequelize): typeof TemperatureReading {
  class Bound extends TemperatureReading {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      temperature_id: { type: 'BINARY(16)', primaryKey: true },
      at: { type: DataTypes.DATE(3), primaryKey: true },
      celsius: { type: DataTypes.DOUBLE, allowNull: false },
    },
    { sequelize, modelName: 'TemperatureReading', tableName: 'temperature_readings', timestamps: false },
  );
}
