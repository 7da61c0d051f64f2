import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';

/** One statement over one field, kept under a code that is derived from the two, so that a link to it never changes. */
export class Permalink extends Model<InferAttributes<Permalink>, InferCreationAttributes<Permalink>> {
  declare code: string;
  declare field: string;
  declare statement: string;
  declare createdAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initPermalink(database: Sequelize): void {
  Permalink.init(
    {
      code: { type: DataTypes.TEXT, primaryKey: true },
      field: { type: DataTypes.TEXT, allowNull: false },
      statement: { type: DataTypes.TEXT, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Permalink', tableName: 'permalinks', timestamps: false },
  );
}
