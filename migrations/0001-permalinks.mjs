import { DataTypes, fn } from 'sequelize';

export async function up({ context: queryInterface }) {
  await queryInterface.createTable('permalinks', {
    code: { type: DataTypes.TEXT, primaryKey: true },
    field: { type: DataTypes.TEXT, allowNull: false },
    statement: { type: DataTypes.TEXT, allowNull: false },
    created_at: { type: DataTypes.DATE, allowNull: false, defaultValue: fn('now') },
  });
}

export async function down({ context: queryInterface }) {
  await queryInterface.dropTable('permalinks');
}
