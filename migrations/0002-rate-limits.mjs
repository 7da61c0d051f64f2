import { DataTypes } from 'sequelize';

// The columns are those the rate limiter expects; it is told not to create its table itself.
export async function up({ context: queryInterface }) {
  await queryInterface.createTable('rate_limits', {
    key: { type: DataTypes.STRING(255), primaryKey: true },
    points: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    expire: { type: DataTypes.BIGINT },
  });
  await queryInterface.addIndex('rate_limits', ['expire'], { name: 'rate_limits_expire' });
}

export async function down({ context: queryInterface }) {
  await queryInterface.dropTable('rate_limits');
}
