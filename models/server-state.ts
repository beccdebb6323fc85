import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** The one row that says which incarnation of the data this server holds. */
export class ServerState extends Model<InferAttributes<ServerState>, InferCreationAttributes<ServerState>> {
  declare id: number;
  declare epoch: number;
}

/** Puts the model of `server_state` on a connection. */
export function defineServerState(sequelize: Sequelize): typeof ServerState {
  class Bound extends ServerState {}
  return Bound.init(
    {
      id: { type: DataTypes.TINYINT, primaryKey: true },
      epoch: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: 'ServerState', tableName: 'server_state', timestamps: false },
  );
}
