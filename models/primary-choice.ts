import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** Which of several field readings of a visit counts, and why; the latest choice stands. */
export class PrimaryChoice extends Model<InferAttributes<PrimaryChoice>, InferCreationAttributes<PrimaryChoice>> {
  declare team_id: Buffer;
  declare visit_id: Buffer;
  declare position: number;
  declare reading_id: Buffer;
  declare reason: string;
  declare actor_id: Buffer;
  declare chosen_at: Date;
}

/** Puts the model of `primary_choices` on a connection. */
export function definePrimaryChoice(sequelize: Sequelize): typeof PrimaryChoice {
  class Bound extends PrimaryChoice {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      visit_id: { type: 'BINARY(16)', primaryKey: true },
      position: { type: DataTypes.INTEGER, primaryKey: true },
      reading_id: { type: 'BINARY(16)', allowNull: false },
      reason: { type: DataTypes.TEXT('medium'), allowNull: false },
      actor_id: { type: 'BINARY(16)', allowNull: false },
      chosen_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'PrimaryChoice', tableName: 'primary_choices', timestamps: false },
  );
}
