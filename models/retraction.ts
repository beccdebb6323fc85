import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A mark taken back; the mark itself stays. */
export class Retraction extends Model<InferAttributes<Retraction>, InferCreationAttributes<Retraction>> {
  declare team_id: Buffer;
  declare op_id: Buffer;
  declare reading_id: Buffer;
  declare target: Buffer;
  declare seq: number;
}

/** Puts the model of `retractions` on a connection. */
export function defineRetraction(sequelize: Sequelize): typeof Retraction {
  class Bound extends Retraction {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      op_id: { type: 'BINARY(16)', primaryKey: true },
      reading_id: { type: 'BINARY(16)', allowNull: false },
      target: { type: 'BINARY(16)', allowNull: false },
      seq: { type: DataTypes.BIGINT, allowNull: false },
    },
    { sequelize, modelName: 'Retraction', tableName: 'retractions', timestamps: false },
  );
}
