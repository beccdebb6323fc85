import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One nest: comb plus pedicel, at its origin. */
export class Nest extends Model<InferAttributes<Nest>, InferCreationAttributes<Nest>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare code: string;
  declare name: string | null;
  declare taxon: string | null;
  declare lat: number | null;
  declare lon: number | null;
  declare accuracy_m: number | null;
  declare opened_by: Buffer;
  declare opened_at: Date;
  declare opened_at_text: string;
  declare archived_at: Date | null;
}

/** Puts the model of `nests` on a connection. */
export function defineNest(sequelize: Sequelize): typeof Nest {
  class Bound extends Nest {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      code: { type: DataTypes.STRING(200), allowNull: false },
      name: { type: DataTypes.STRING(200), allowNull: true },
      taxon: { type: DataTypes.STRING(200), allowNull: true },
      lat: { type: DataTypes.DOUBLE, allowNull: true },
      lon: { type: DataTypes.DOUBLE, allowNull: true },
      accuracy_m: { type: DataTypes.DOUBLE, allowNull: true },
      opened_by: { type: 'BINARY(16)', allowNull: false },
      opened_at: { type: DataTypes.DATE(3), allowNull: false },
      opened_at_text: { type: DataTypes.STRING(200), allowNull: false },
      archived_at: { type: DataTypes.DATE(3), allowNull: true },
    },
    { sequelize, modelName: 'Nest', tableName: 'nests', timestamps: false },
  );
}
