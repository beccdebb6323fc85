import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A link with which a person may set a new password once; only its hash is kept. */
export class ResetToken extends Model<InferAttributes<ResetToken>, InferCreationAttributes<ResetToken>> {
  declare token_hash: Buffer;
  declare user_id: Buffer;
  declare expires_at: Date;
  declare used_at: Date | null;
}

/** Puts the model of `reset_tokens` on a connection. */
export function defineResetToken(sequelize: Sequelize): typeof ResetToken {
  class Bound extends ResetToken {}
  return Bound.init(
    {
      token_hash: { type: 'BINARY(32)', primaryKey: true },
      user_id: { type: 'BINARY(16)', allowNull: false },
      expires_at: { type: DataTypes.DATE(3), allowNull: false },
      used_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'ResetToken', tableName: 'reset_tokens', timestamps: false },
  );
}
