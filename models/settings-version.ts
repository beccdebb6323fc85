import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A signed set of programme settings; records say which version applied. */
export class SettingsVersion extends Model<InferAttributes<SettingsVersion>, InferCreationAttributes<SettingsVersion>> {
  declare team_id: Buffer;
  declare version: number;
  declare settings: string;
  declare signed_by: Buffer | null;
  declare signed_at: Date;
  declare reason: CreationOptional<string | null>;
}

/** Puts the model of `settings_versions` on a connection. */
export function defineSettingsVersion(sequelize: Sequelize): typeof SettingsVersion {
  class Bound extends SettingsVersion {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      settings: { type: DataTypes.TEXT('long'), allowNull: false },
      signed_by: { type: 'BINARY(16)', allowNull: true },
      signed_at: { type: DataTypes.DATE(3), allowNull: false },
      reason: { type: DataTypes.TEXT('medium'), allowNull: true },
    },
    { sequelize, modelName: 'SettingsVersion', tableName: 'settings_versions', timestamps: false },
  );
}
