import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A locked reading drawn to be read again, by another reader or by the same one. */
export class ReadingSample extends Model<InferAttributes<ReadingSample>, InferCreationAttributes<ReadingSample>> {
  declare team_id: Buffer;
  declare id: Buffer;
  /** `YYYY-MM`, local month in which the reading was locked. */
  declare month: string;
  declare purpose: string;
  declare reading_id: Buffer;
  declare seed: number;
  declare drawn_by: Buffer;
  declare drawn_at: Date;
}

/** Puts the model of `reading_samples` on a connection. */
export function defineReadingSample(sequelize: Sequelize): typeof ReadingSample {
  class Bound extends ReadingSample {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      month: { type: DataTypes.CHAR(7), allowNull: false },
      purpose: { type: DataTypes.STRING(32), allowNull: false },
      reading_id: { type: 'BINARY(16)', allowNull: false },
      seed: { type: DataTypes.BIGINT, allowNull: false },
      drawn_by: { type: 'BINARY(16)', allowNull: false },
      drawn_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'ReadingSample', tableName: 'reading_samples', timestamps: false },
  );
}
