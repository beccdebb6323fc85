import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** An enrolled phone of one person in one team. */
export class Device extends Model<InferAttributes<Device>, InferCreationAttributes<Device>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare user_id: Buffer;
  declare label: string;
  declare device_key: Buffer;
  declare enrolled_at: Date;
  declare last_seen_at: Date;
  declare revoked_at: Date | null;
  /** Operations the phone said it still holds, when it last asked; null before it said so. */
  declare unsent: CreationOptional<number | null>;
  declare revoked_by: CreationOptional<Buffer | null>;
  declare revoke_reason: CreationOptional<string | null>;
}

/** Puts the model of `devices` on a connection. */
export function defineDevice(sequelize: Sequelize): typeof Device {
  class Bound extends Device {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      user_id: { type: 'BINARY(16)', allowNull: false },
      label: { type: DataTypes.STRING(200), allowNull: false },
      device_key: { type: 'BINARY(32)', allowNull: false },
      enrolled_at: { type: DataTypes.DATE(3), allowNull: false },
      last_seen_at: { type: DataTypes.DATE(3), allowNull: false },
      revoked_at: { type: DataTypes.DATE(3), allowNull: true },
      unsent: { type: DataTypes.INTEGER, allowNull: true },
      revoked_by: { type: 'BINARY(16)', allowNull: true },
      revoke_reason: { type: DataTypes.STRING(200), allowNull: true },
    },
    { sequelize, modelName: 'Device', tableName: 'devices', timestamps: false },
  );
}
