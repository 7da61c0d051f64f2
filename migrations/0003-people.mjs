import { DataTypes, fn, literal } from 'sequelize';

// Roles and states are checked texts, not database enums: a new one is then an ordinary migration.
const roles = "('reader', 'author', 'reviewer', 'steward')";

const key = { type: DataTypes.UUID, primaryKey: true, defaultValue: fn('gen_random_uuid') };
const text = { type: DataTypes.TEXT, allowNull: false };
const moment = { type: DataTypes.DATE, allowNull: false, defaultValue: fn('now') };
const later = { type: DataTypes.DATE };
const to = (table, onDelete, more = {}) => ({
  type: DataTypes.UUID,
  allowNull: onDelete === 'SET NULL',
  references: { model: table, key: 'id' },
  onDelete,
  onUpdate: 'CASCADE',
  ...more,
});

export async function up({ context: queryInterface }) {
  const check = (table, name, condition) =>
    queryInterface.addConstraint(table, {
      type: 'check',
      fields: [name],
      name: `${table}_${name}_check`,
      where: literal(condition),
    });

  await queryInterface.createTable('users', {
    id: key,
    email: { ...text, unique: true },
    name: text,
    password_hash: text,
    // A session carries the version it was made with; raising it ends every session at once.
    session_version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
    created_at: moment,
  });
  await check('users', 'email', 'email = lower(email)');

  await queryInterface.createTable('groups', {
    id: key,
    name: text,
    slug: { ...text, unique: true },
    // The number of the next identity; taken under the lock of this row.
    next_number: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
    created_at: moment,
  });
  await check('groups', 'slug', "slug ~ '^[a-z][a-z0-9]*(-[a-z0-9]*[a-z][a-z0-9]*)*$'");

  await queryInterface.createTable('memberships', {
    group_id: to('groups', 'CASCADE', { primaryKey: true }),
    user_id: to('users', 'CASCADE', { primaryKey: true }),
    role: text,
    created_at: moment,
  });
  await check('memberships', 'role', `role IN ${roles}`);
  await queryInterface.addIndex('memberships', ['user_id'], { name: 'memberships_user' });

  await queryInterface.createTable('invitations', {
    id: key,
    group_id: to('groups', 'CASCADE'),
    email: text,
    role: text,
    // Empty until the mail is made, so that the clear token exists in that mail alone.
    token_hash: { type: DataTypes.TEXT, unique: true },
    invited_by: to('users', 'SET NULL'),
    created_at: moment,
    expires_at: { type: DataTypes.DATE, allowNull: false },
    accepted_at: later,
    revoked_at: later,
  });
  await check('invitations', 'role', `role IN ${roles}`);
  await check('invitations', 'email', 'email = lower(email)');
  await queryInterface.addIndex('invitations', ['group_id', 'email'], {
    name: 'invitations_open',
    unique: true,
    where: { accepted_at: null, revoked_at: null },
  });

  await queryInterface.createTable('password_resets', {
    id: key,
    user_id: to('users', 'CASCADE'),
    token_hash: { type: DataTypes.TEXT, unique: true },
    created_at: moment,
    expires_at: { type: DataTypes.DATE, allowNull: false },
    used_at: later,
  });
  await queryInterface.addIndex('password_resets', ['user_id'], { name: 'password_resets_user' });

  await queryInterface.createTable('api_tokens', {
    id: key,
    group_id: to('groups', 'CASCADE'),
    user_id: to('users', 'CASCADE'),
    name: text,
    token_hash: { ...text, unique: true },
    // The last characters, by which its owner knows it again.
    ending: text,
    scopes: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
    created_at: moment,
    expires_at: { type: DataTypes.DATE, allowNull: false },
    last_used_at: later,
    revoked_at: later,
  });
  await check('api_tokens', 'scopes', "scopes <@ ARRAY['read', 'compute', 'write'] AND cardinality(scopes) > 0");
  await queryInterface.addIndex('api_tokens', ['group_id', 'user_id'], { name: 'api_tokens_owner' });

  await queryInterface.createTable('audit_events', {
    id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
    group_id: to('groups', 'CASCADE'),
    actor_id: to('users', 'SET NULL'),
    // The name as it was then: it outlives the account.
    actor_name: text,
    action: text,
    subject: text,
    detail: { type: DataTypes.JSONB, allowNull: false, defaultValue: {} },
    at: moment,
  });
  await queryInterface.addIndex('audit_events', ['group_id', 'id'], { name: 'audit_events_group' });

  await queryInterface.createTable('drafts', {
    user_id: to('users', 'CASCADE', { primaryKey: true }),
    key: { type: DataTypes.TEXT, primaryKey: true },
    body: { type: DataTypes.JSONB, allowNull: false },
    changed_at: moment,
  });
}

export async function down({ context: queryInterface }) {
  for (const table of [
    'drafts',
    'audit_events',
    'api_tokens',
    'password_resets',
    'invitations',
    'memberships',
    'groups',
    'users',
  ])
    await queryInterface.dropTable(table);
}
