import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** The settings a lead biologist is working on; one a team, gone once signed. */
export class SettingsDraft extends Model<InferAttributes<SettingsDraft>, InferCreationAttributes<SettingsDraft>> {
  declare team_id: Buffer;
  declare based_on: number;
  declare settings: string;
  declare edited_by: Buffer;
  declare edited_at: Date;
}

/** Puts the model of `settings_drafts` on a connection. */
export function defineSettingsDraft(sequelize: Sequelize): typeof SettingsDraft {
  class Bound extends SettingsDraft {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      based_on: { type: DataTypes.INTEGER, allowNull: false },
      settings: { type: DataTypes.TEXT('long'), allowNull: false },
      edited_by: { type: 'BINARY(16)', allowNull: false },
      edited_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'SettingsDraft', tableName: 'settings_drafts', timestamps: false },
  );
}
