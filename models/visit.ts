import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One dated look at a nest. */
export class Visit extends Model<InferAttributes<Visit>, InferCreationAttributes<Visit>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare nest_id: Buffer;
  declare purpose: string;
  declare started_at: Date;
  declare started_at_text: string;
  declare opened_by: Buffer;
  declare archived_at: Date | null;
}

/** Puts the model of `visits` on a connection. */
export function defineVisit(sequelize: Sequelize): typeof Visit {
  class Bound extends Visit {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      nest_id: { type: 'BINARY(16)', allowNull: false },
      purpose: { type: DataTypes.STRING(32), allowNull: false },
      started_at: { type: DataTypes.DATE(3), allowNull: false },
      started_at_text: { type: DataTypes.STRING(200), allowNull: false },
      opened_by: { type: 'BINARY(16)', allowNull: false },
      archived_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'Visit', tableName: 'visits', timestamps: false },
  );
}
