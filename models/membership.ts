import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { MemberRole } from './role';

/** One person in one group, with a role. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare groupId: string;
  declare userId: string;
  declare role: MemberRole;
  declare createdAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initMembership(database: Sequelize): void {
  Membership.init(
    {
      groupId: { type: DataTypes.UUID, primaryKey: true, field: 'group_id' },
      userId: { type: DataTypes.UUID, primaryKey: true, field: 'user_id' },
      role: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Membership', tableName: 'memberships', timestamps: false },
  );
}
