import { DataTypes, Model } from 'sequelize';
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize';
import type { CheckVerdict, IdentityKind, IdentityState, Visibility } from './identity-words';

/** A named identity of a group, with what the register is searched by copied from its current revision. */
export class Identity extends Model<InferAttributes<Identity>, InferCreationAttributes<Identity>> {
  declare id: CreationOptional<string>;
  declare groupId: string;
  declare number: number;
  declare revision: number;
  declare state: IdentityState;
  declare visibility: Visibility;
  declare keeperId: CreationOptional<string | null>;
  declare keeperName: string;
  declare name: string;
  declare kind: IdentityKind;
  declare field: string;
  declare degrees: CreationOptional<number[]>;
  declare tags: CreationOptional<string[]>;
  declare verdict: CreationOptional<CheckVerdict | null>;
  declare words: unknown;
  declare withdrawnReason: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare changedAt: CreationOptional<Date>;
}

/** Binds the class to its table in the given database. */
export function initIdentity(database: Sequelize): void {
  Identity.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false, field: 'group_id' },
      number: { type: DataTypes.INTEGER, allowNull: false },
      revision: { type: DataTypes.INTEGER, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false },
      visibility: { type: DataTypes.TEXT, allowNull: false },
      keeperId: { type: DataTypes.UUID, field: 'keeper_id' },
      keeperName: { type: DataTypes.TEXT, allowNull: false, field: 'keeper_name' },
      name: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      field: { type: DataTypes.TEXT, allowNull: false },
      degrees: { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: false, defaultValue: [] },
      tags: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
      verdict: { type: DataTypes.TEXT },
      words: { type: DataTypes.TSVECTOR, allowNull: false },
      withdrawnReason: { type: DataTypes.TEXT, field: 'withdrawn_reason' },
      createdAt: { type: DataTypes.DATE, allowNull: false, field: 'created_at', defaultValue: DataTypes.NOW },
      changedAt: { type: DataTypes.DATE, allowNull: false, field: 'changed_at', defaultValue: DataTypes.NOW },
    },
    { sequelize: database, modelName: 'Identity', tableName: 'identities', timestamps: false },
  );
}
