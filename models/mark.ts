import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One observation of one cell; append-only. */
export class Mark extends Model<InferAttributes<Mark>, InferCreationAttributes<Mark>> {
  declare team_id: Buffer;
  declare op_id: Buffer;
  declare reading_id: Buffer;
  declare seq: number;
  declare q: number;
  declare r: number;
  declare state: string;
  declare nectar: boolean;
  declare unsure: boolean;
  declare reused: boolean;
  declare scrap: boolean;
  declare instar: number | null;
  declare note: string | null;
  declare supersedes: Buffer | null;
  declare hlc: string;
  declare at_text: string;
}

/** Puts the model of `marks` on a connection. */
export function defineMark(sequelize: Sequelize): typeof Mark {
  class Bound extends Mark {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      op_id: { type: 'BINARY(16)', primaryKey: true },
      reading_id: { type: 'BINARY(16)', allowNull: false },
      seq: { type: DataTypes.BIGINT, allowNull: false },
      q: { type: DataTypes.SMALLINT, allowNull: false },
      r: { type: DataTypes.SMALLINT, allowNull: false },
      state: { type: DataTypes.STRING(32), allowNull: false },
      nectar: { type: DataTypes.BOOLEAN, allowNull: false },
      unsure: { type: DataTypes.BOOLEAN, allowNull: false },
      reused: { type: DataTypes.BOOLEAN, allowNull: false },
      scrap: { type: DataTypes.BOOLEAN, allowNull: false },
      instar: { type: DataTypes.TINYINT, allowNull: true },
      note: { type: DataTypes.TEXT('medium'), allowNull: true },
      supersedes: { type: 'BINARY(16)', allowNull: true },
      hlc: { type: DataTypes.STRING(32), allowNull: false },
      at_text: { type: DataTypes.STRING(200), allowNull: false },
    },
    { sequelize, modelName: 'Mark', tableName: 'marks', timestamps: false },
  );
}
