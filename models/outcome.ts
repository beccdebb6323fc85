import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** The agreed end state of a job. */
export class Outcome extends Model<InferAttributes<Outcome>, InferCreationAttributes<Outcome>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare nest_id: Buffer;
  declare outcome: string;
  declare decided_on: string;
  declare note: string | null;
}

/** Puts the model of `outcomes` on a connection. */
export function defineOutcome(sequelize: Sequelize): typeof Outcome {
  class Bound extends Outcome {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      nest_id: { type: 'BINARY(16)', allowNull: false },
      outcome: { type: DataTypes.STRING(200), allowNull: false },
      decided_on: { type: DataTypes.DATEONLY, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: true },
    },
    { sequelize, modelName: 'Outcome', tableName: 'outcomes', timestamps: false },
  );
}
