import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { Scope } from './scope';

/** A token by which a script acts for a person in a group. Only its hash is kept. */
export class ApiToken extends Model<InferAttributes<ApiToken>, InferCreationAttributes<ApiToken>> {
  declare id: CreationOptional<string>;
  declare groupId: string;
  declare userId: string;
  declare name: string;
  declare tokenHash: string;
  declare ending: string;
  declare scopes: Scope[];
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare lastUsedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
}

/** Binds the class to its table in the given database. */
export function initApiToken(database: Sequelize): void {
  ApiToken.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false, field: 'group_id' },
      userId: { type: DataTypes.UUID, allowNull: false, field: 'user_id' },
      name: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false, field: 'token_hash' },
      ending: { type: DataTypes.TEXT, allowNull: false },
      scopes: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
      expiresAt: { type: DataTypes.DATE, allowNull: false, field: 'expires_at' },
      lastUsedAt: { type: DataTypes.DATE, field: 'last_used_at' },
      revokedAt: { type: DataTypes.DATE, field: 'revoked_at' },
    },
    { sequelize: database, modelName: 'ApiToken', tableName: 'api_tokens', timestamps: false },
  );
}
