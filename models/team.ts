import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One programme. Teams share a server and never see each other. */
export class Team extends Model<InferAttributes<Team>, InferCreationAttributes<Team>> {
  declare id: Buffer;
  declare name: string;
  declare zone: string;
  declare home_lat: number | null;
  declare home_lon: number | null;
}

/** Puts the model of `teams` on a connection. */
export function defineTeam(sequelize: Sequelize): typeof Team {
  class Bound extends Team {}
  return Bound.init(
    {
      id: { type: 'BINARY(16)', primaryKey: true },
      name: { type: DataTypes.STRING(200), allowNull: false },
      zone: { type: DataTypes.STRING(200), allowNull: false },
      home_lat: { type: DataTypes.DOUBLE, allowNull: true },
      home_lon: { type: DataTypes.DOUBLE, allowNull: true },
    },
    { sequelize, modelName: 'Team', tableName: 'teams', timestamps: false },
  );
}
