import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One sign-in attempt, by a hash of the address or of the e-mail; never the text itself. */
export class LoginAttempt extends Model<InferAttributes<LoginAttempt>, InferCreationAttributes<LoginAttempt>> {
  declare id: Buffer;
  declare subject: Buffer;
  declare failed: boolean;
  declare at: Date;
}

/** Puts the model of `login_attempts` on a connection. */
export function defineLoginAttempt(sequelize: Sequelize): typeof LoginAttempt {
  class Bound extends LoginAttempt {}
  return Bound.init(
    {
      id: { type: 'BINARY(16)', primaryKey: true },
      subject: { type: 'BINARY(32)', allowNull: false },
      failed: { type: DataTypes.BOOLEAN, allowNull: false },
      at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'LoginAttempt', tableName: 'login_attempts', timestamps: false },
  );
}
