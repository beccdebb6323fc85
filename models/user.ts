import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A person who can sign in. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: Buffer;
  declare email: string;
  declare display_name: string;
  declare password_hash: string;
  declare disabled_at: Date | null;
}

/** Puts the model of `users` on a connection. */
export function defineUser(sequelize: Sequelize): typeof User {
  class Bound extends User {}
  return Bound.init(
    {
      id: { type: 'BINARY(16)', primaryKey: true },
      email: { type: DataTypes.STRING(200), allowNull: false },
      display_name: { type: DataTypes.STRING(200), allowNull: false },
      password_hash: { type: DataTypes.STRING(255), allowNull: false },
      disabled_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'User', tableName: 'users', timestamps: false },
  );
}
