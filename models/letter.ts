import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** That a letter was written, to whom, and whether it went out. Its words, which hold a secret link, are not kept here. */
export class Letter extends Model<InferAttributes<Letter>, InferCreationAttributes<Letter>> {
  declare team_id: Buffer;
  declare id: Buffer;
  declare kind: string;
  declare recipient: string;
  /** The invitation or person it is about. */
  declare subject_id: Buffer;
  declare written_at: Date;
  declare sent_at: Date | null;
  /** A short word for why it did not go out. */
  declare failure: string | null;
}

/** Puts the model of `letters` on a connection. */
export function defineLetter(sequelize: Sequelize): typeof Letter {
  class Bound extends Letter {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      id: { type: 'BINARY(16)', primaryKey: true },
      kind: { type: DataTypes.STRING(32), allowNull: false },
      recipient: { type: DataTypes.STRING(200), allowNull: false },
      subject_id: { type: 'BINARY(16)', allowNull: false },
      written_at: { type: DataTypes.DATE(3), allowNull: false },
      sent_at: { type: DataTypes.DATE(3), allowNull: true },
      failure: { type: DataTypes.STRING(32), allowNull: true },
    },
    { sequelize, modelName: 'Letter', tableName: 'letters', timestamps: false },
  );
}
