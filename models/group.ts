import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** A research group. Its slug begins the key of each of its identities. */
export class Group extends Model<InferAttributes<Group>, InferCreationAttributes<Group>> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare slug: string;
  declare nextNumber: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initGroup(database: Sequelize): void {
  Group.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      name: { type: DataTypes.TEXT, allowNull: false },
      slug: { type: DataTypes.TEXT, allowNull: false },
      nextNumber: { type: DataTypes.INTEGER, allowNull: false, field: 'next_number', defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Group', tableName: 'groups', timestamps: false },
  );
}
