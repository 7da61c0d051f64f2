import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { MemberRole } from './role';

/** An invitation into a group, open until it is accepted, revoked or expired. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: CreationOptional<string>;
  declare groupId: string;
  declare email: string;
  declare role: MemberRole;
  declare tokenHash: CreationOptional<string | null>;
  declare invitedBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare acceptedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
}

/** Binds the class to its table in the given database. */
export function initInvitation(database: Sequelize): void {
  Invitation.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false, field: 'group_id' },
      email: { type: DataTypes.TEXT, allowNull: false },
      role: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, field: 'token_hash' },
      invitedBy: { type: DataTypes.UUID, field: 'invited_by' },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
      expiresAt: { type: DataTypes.DATE, allowNull: false, field: 'expires_at' },
      acceptedAt: { type: DataTypes.DATE, field: 'accepted_at' },
      revokedAt: { type: DataTypes.DATE, field: 'revoked_at' },
    },
    { sequelize: database, modelName: 'Invitation', tableName: 'invitations', timestamps: false },
  );
}
