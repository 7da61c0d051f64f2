import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** A request that made an identity, by the key its caller gave it. */
export class IdempotencyKey extends Model<InferAttributes<IdempotencyKey>, InferCreationAttributes<IdempotencyKey>> {
  declare userId: string;
  declare groupId: string;
  declare key: string;
  declare requestDigest: string;
  declare identityId: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initIdempotencyKey(database: Sequelize): void {
  IdempotencyKey.init(
    {
      userId: { type: DataTypes.UUID, primaryKey: true, field: 'user_id' },
      groupId: { type: DataTypes.UUID, primaryKey: true, field: 'group_id' },
      key: { type: DataTypes.TEXT, primaryKey: true },
      requestDigest: { type: DataTypes.TEXT, allowNull: false, field: 'request_digest' },
      identityId: { type: DataTypes.UUID, field: 'identity_id' },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'IdempotencyKey', tableName: 'idempotency_keys', timestamps: false },
  );
}
