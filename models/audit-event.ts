import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** Who did what in a group, and when. Rows are only ever added. */
export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  declare id: CreationOptional<string>;
  declare groupId: string;
  declare actorId: CreationOptional<string | null>;
  declare actorName: string;
  declare action: string;
  declare subject: string;
  declare detail: Record<string, unknown>;
  declare at: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initAuditEvent(database: Sequelize): void {
  AuditEvent.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      groupId: { type: DataTypes.UUID, allowNull: false, field: 'group_id' },
      actorId: { type: DataTypes.UUID, field: 'actor_id' },
      actorName: { type: DataTypes.TEXT, allowNull: false, field: 'actor_name' },
      action: { type: DataTypes.TEXT, allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      detail: { type: DataTypes.JSONB, allowNull: false },
      at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'AuditEvent', tableName: 'audit_events', timestamps: false },
  );
}
