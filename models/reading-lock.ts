import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** One locked version of a final reading: what was in it, under which settings, and who stands behind it. */
export class ReadingLock extends Model<InferAttributes<ReadingLock>, InferCreationAttributes<ReadingLock>> {
  declare team_id: Buffer;
  declare reading_id: Buffer;
  declare version: number;
  declare cells_hash: Buffer;
  declare settings_version: number;
  declare names: string;
  declare actor_id: Buffer;
  declare locked_at: Date;
}

/** Puts the model of `reading_locks` on a connection. */
export function defineReadingLock(sequelize: Sequelize): typeof ReadingLock {
  class Bound extends ReadingLock {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      reading_id: { type: 'BINARY(16)', primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      cells_hash: { type: 'BINARY(32)', allowNull: false },
      settings_version: { type: DataTypes.INTEGER, allowNull: false },
      names: { type: DataTypes.TEXT('medium'), allowNull: false },
      actor_id: { type: 'BINARY(16)', allowNull: false },
      locked_at: { type: DataTypes.DATE(3), allowNull: false },
    },
    { sequelize, modelName: 'ReadingLock', tableName: 'reading_locks', timestamps: false },
  );
}
