import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A person who offers a release place. */
export class Host extends Model<InferAttributes<Host>, InferCreationAttributes<Host>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare code: string;
  declare name: string;
  declare place_name: string;
  declare lat: number | null;
  declare lon: number | null;
  declare capacity: number;
  declare note: string | null;
  declare withdrawn_on: string | null;
}

/** Puts the model of `hosts` on a connection. */
export function defineHost(sequelize: Sequelize): typeof Host {
  class Bound extends Host {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      code: { type: DataTypes.STRING(200), allowNull: false },
      name: { type: DataTypes.STRING(200), allowNull: false },
      place_name: { type: DataTypes.STRING(200), allowNull: false },
      lat: { type: DataTypes.DOUBLE, allowNull: true },
      lon: { type: DataTypes.DOUBLE, allowNull: true },
      capacity: { type: DataTypes.INTEGER, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: true },
      withdrawn_on: { type: DataTypes.DATEONLY, allowNull: true },
    },
    { sequelize, modelName: 'Host', tableName: 'hosts', timestamps: false },
  );
}
