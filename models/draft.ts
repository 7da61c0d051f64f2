import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** Something a person began to write and has not kept yet. */
export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
  declare userId: string;
  declare key: string;
  declare body: Record<string, unknown>;
  declare changedAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initDraft(database: Sequelize): void {
  Draft.init(
    {
      userId: { type: DataTypes.UUID, primaryKey: true, field: 'user_id' },
      key: { type: DataTypes.TEXT, primaryKey: true },
      body: { type: DataTypes.JSONB, allowNull: false },
      changedAt: { type: DataTypes.DATE, allowNull: false, field: 'changed_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Draft', tableName: 'drafts', timestamps: false },
  );
}
