import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { IdentityKind } from './identity-words';

/** One wording of an identity. Never changed once it is there. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: CreationOptional<string>;
  declare identityId: string;
  declare number: number;
  declare name: string;
  declare kind: IdentityKind;
  declare field: string;
  declare statement: string;
  declare hypotheses: CreationOptional<string[]>;
  declare place: CreationOptional<string | null>;
  declare uniformizer: CreationOptional<string | null>;
  declare value: CreationOptional<string | null>;
  declare warning: CreationOptional<boolean>;
  declare reference: CreationOptional<string | null>;
  declare doi: CreationOptional<string | null>;
  declare arxiv: CreationOptional<string | null>;
  declare tags: CreationOptional<string[]>;
  declare remark: CreationOptional<string | null>;
  declare change: CreationOptional<string | null>;
  declare authorId: CreationOptional<string | null>;
  declare authorName: string;
  declare createdAt: CreationOptional<Date>;
  declare typeset: CreationOptional<Record<string, unknown> | null>;
}

/** Binds the class to its table in the given database. */
export function initRevision(database: Sequelize): void {
  Revision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      identityId: { type: DataTypes.UUID, allowNull: false, field: 'identity_id' },
      number: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      field: { type: DataTypes.TEXT, allowNull: false },
      statement: { type: DataTypes.TEXT, allowNull: false },
      hypotheses: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
      place: { type: DataTypes.TEXT },
      uniformizer: { type: DataTypes.TEXT },
      value: { type: DataTypes.TEXT },
      warning: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      reference: { type: DataTypes.TEXT },
      doi: { type: DataTypes.TEXT },
      arxiv: { type: DataTypes.TEXT },
      tags: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
      remark: { type: DataTypes.TEXT },
      change: { type: DataTypes.TEXT },
      authorId: { type: DataTypes.UUID, field: 'author_id' },
      authorName: { type: DataTypes.TEXT, allowNull: false, field: 'author_name' },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
      typeset: { type: DataTypes.JSONB },
    },
    { sequelize: database, modelName: 'Revision', tableName: 'revisions', timestamps: false },
  );
}
