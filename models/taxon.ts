import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A named kind, with its status in the area of the team. */
export class Taxon extends Model<InferAttributes<Taxon>, InferCreationAttributes<Taxon>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare scientific_name: string;
  declare status: string;
}

/** Puts the model of `taxa` on a connection. */
export function defineTaxon(sequelize: Sequelize): typeof Taxon {
  class Bound extends Taxon {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      scientific_name: { type: DataTypes.STRING(200), allowNull: false },
      status: { type: DataTypes.STRING(32), allowNull: false },
    },
    { sequelize, modelName: 'Taxon', tableName: 'taxa', timestamps: false },
  );
}
