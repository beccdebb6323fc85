import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A letter that makes its reader a member. Of the link in it only the hash is kept. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare email: string;
  declare role: string;
  declare invited_by: Buffer | null;
  declare token_hash: Buffer;
  declare invited_at: Date;
  declare expires_at: Date;
  declare accepted_at: Date | null;
  declare withdrawn_at: Date | null;
}

/** Puts the model of `invitations` on a connection. */
export function defineInvitation(sequelize: Sequelize): typeof Invitation {
  class Bound extends Invitation {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      email: { type: DataTypes.STRING(200), allowNull: false },
      role: { type: DataTypes.STRING(32), allowNull: false },
      invited_by: { type: 'BINARY(16)', allowNull: true },
      token_hash: { type: 'BINARY(32)', allowNull: false },
      invited_at: { type: DataTypes.DATE(3), allowNull: false },
      expires_at: { type: DataTypes.DATE(3), allowNull: false },
      accepted_at: { type: DataTypes.DATE(3), allowNull: true },
      withdrawn_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'Invitation', tableName: 'invitations', timestamps: false },
  );
}
