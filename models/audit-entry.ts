import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A chain of what people did; each entry carries the hash of the one before. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare team_id: Buffer;
  declare seq: number;
  declare at: Date;
  declare actor_id: Buffer | null;
  declare action: string;
  declare subject_id: Buffer | null;
  declare detail: string;
  declare previous_hash: Buffer;
  declare hash: Buffer;
}

/** Puts the model of `audit_entries` on a connection. */
export function defineAuditEntry(sequelize: Sequelize): typeof AuditEntry {
  class Bound extends AuditEntry {}
  return Bound.init(
    {
      team_id: { type: 'BINARY(16)', primaryKey: true },
      seq: { type: DataTypes.BIGINT, primaryKey: true },
      at: { type: DataTypes.DATE(3), allowNull: false },
      actor_id: { type: 'BINARY(16)', allowNull: true },
      action: { type: DataTypes.STRING(32), allowNull: false },
      subject_id: { type: 'BINARY(16)', allowNull: true },
      detail: { type: DataTypes.TEXT('long'), allowNull: false },
      previous_hash: { type: 'BINARY(32)', allowNull: false },
      hash: { type: 'BINARY(32)', allowNull: false },
    },
    { sequelize, modelName: 'AuditEntry', tableName: 'audit_entries', timestamps: false },
  );
}
