import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A stored brood answer; recomputable from its inputs, kept with the versions that made it. */
export class Estimate extends Model<InferAttributes<Estimate>, InferCreationAttributes<Estimate>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare nest_id: Buffer;
  declare input_digest: Buffer;
  declare model_version: string;
  declare settings_version: number;
  declare answer: string;
  declare created_at: Date;
}

/** Puts the model of `estimates` on a connection. */
export function defineEstimate(sequelize: Sequelize): typeof Estimate {
  class Bound extends Estimate {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      nest_id: { type: 'BINARY(16)', allowNull: false },
      input_digest: { type: 'BINARY(32)', allowNull: false },
      model_version: { type: DataTypes.STRING(32), allowNull: false },
      settings_version: { type: DataTypes.INTEGER, allowNull: false },
      answer: { type: DataTypes.TEXT('long'), allowNull: false },
      created_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'Estimate', tableName: 'estimates', timestamps: false },
  );
}
