import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A sign-in that can be ended from the office. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare user_id: Buffer;
  declare created_at: Date;
  declare last_seen_at: Date;
  declare expires_at: Date;
  declare revoked_at: Date | null;
  /** Browser and system in words, such as `Firefox on Windows`; no address and no place. */
  declare agent: CreationOptional<string>;
}

/** Puts the model of `sessions` on a connection. */
export function defineSession(sequelize: Sequelize): typeof Session {
  class Bound extends Session {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      user_id: { type: 'BINARY(16)', allowNull: false },
      created_at: { type: DataTypes.DATE(3), allowNull: false },
      last_seen_at: { type: DataTypes.DATE(3), allowNull: false },
      expires_at: { type: DataTypes.DATE(3), allowNull: false },
      revoked_at: { type: DataTypes.DATE(3), allowNull: true },
      agent: { type: DataTypes.STRING(200), allowNull: false, defaultValue: '' },
    },
    { sequelize, modelName: 'Session', tableName: 'sessions', timestamps: false },
  );
}
