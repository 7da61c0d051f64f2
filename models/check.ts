import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { CheckVerdict } from './identity-words';

/** One check of one revision by the engine. */
export class Check extends Model<InferAttributes<Check>, InferCreationAttributes<Check>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare verdict: CheckVerdict;
  declare evidence: unknown;
  declare engine: string;
  declare durationMs: number;
  declare createdAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initCheck(database: Sequelize): void {
  Check.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      revisionId: { type: DataTypes.UUID, allowNull: false, field: 'revision_id' },
      verdict: { type: DataTypes.TEXT, allowNull: false },
      evidence: { type: DataTypes.JSONB, allowNull: false },
      engine: { type: DataTypes.TEXT, allowNull: false },
      durationMs: { type: DataTypes.INTEGER, allowNull: false, field: 'duration_ms' },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Check', tableName: 'checks', timestamps: false },
  );
}
