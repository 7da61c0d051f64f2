import { DataTypes, fn, literal } from 'sequelize';

const key = { type: DataTypes.UUID, primaryKey: true, defaultValue: fn('gen_random_uuid') };
const text = { type: DataTypes.TEXT, allowNull: false };
const maybe = { type: DataTypes.TEXT };
const count = { type: DataTypes.INTEGER, allowNull: false };
const texts = { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] };
const moment = { type: DataTypes.DATE, allowNull: false, defaultValue: fn('now') };
const to = (table, onDelete) => ({
  type: DataTypes.UUID,
  allowNull: onDelete === 'SET NULL',
  references: { model: table, key: 'id' },
  onDelete,
  onUpdate: 'CASCADE',
});
const verdicts = "('equal', 'different', 'undecided', 'stopped', 'refused')";

export async function up({ context: queryInterface }) {
  const check = (table, name, condition) =>
    queryInterface.addConstraint(table, {
      type: 'check',
      fields: [name],
      name: `${table}_${name}_check`,
      where: literal(condition),
    });

  // What the register is searched, filtered and sorted by stands in one row: that of the current revision, copied.
  await queryInterface.createTable('identities', {
    id: key,
    group_id: to('groups', 'CASCADE'),
    number: count,
    revision: count,
    state: text,
    visibility: text,
    keeper_id: to('users', 'SET NULL'),
    keeper_name: text,
    name: text,
    kind: text,
    field: text,
    degrees: { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: false, defaultValue: [] },
    tags: texts,
    verdict: maybe,
    words: { type: DataTypes.TSVECTOR, allowNull: false },
    withdrawn_reason: maybe,
    created_at: moment,
    changed_at: moment,
  });
  await check('identities', 'state', "state IN ('draft', 'checked', 'withdrawn')");
  await check('identities', 'visibility', "visibility IN ('group', 'public')");
  await check('identities', 'kind', "kind IN ('equality', 'residue')");
  await check('identities', 'verdict', `verdict IN ${verdicts}`);
  await check('identities', 'withdrawn_reason', "(state = 'withdrawn') = (withdrawn_reason IS NOT NULL)");
  await queryInterface.addIndex('identities', ['group_id', 'number'], { name: 'identities_number', unique: true });
  await queryInterface.addIndex('identities', ['group_id', 'changed_at', 'number'], { name: 'identities_changed' });
  await queryInterface.addIndex('identities', ['group_id', 'name', 'number'], { name: 'identities_name' });
  await queryInterface.addIndex('identities', ['group_id', 'state', 'changed_at', 'number'], {
    name: 'identities_state',
  });
  await queryInterface.addIndex('identities', ['words'], { name: 'identities_words', using: 'gin' });
  await queryInterface.addIndex('identities', ['tags'], { name: 'identities_tags', using: 'gin' });

  await queryInterface.createTable('revisions', {
    id: key,
    identity_id: to('identities', 'CASCADE'),
    number: count,
    name: text,
    kind: text,
    field: text,
    // Of an equality the statement as it was typed; of a residue the class, with place, uniformizer and value beside it.
    statement: text,
    hypotheses: texts,
    place: maybe,
    uniformizer: maybe,
    value: maybe,
    // Says that the sides are not the same.
    warning: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    reference: maybe,
    doi: maybe,
    arxiv: maybe,
    tags: texts,
    remark: maybe,
    change: maybe,
    author_id: to('users', 'SET NULL'),
    author_name: text,
    created_at: moment,
  });
  await check('revisions', 'kind', "kind IN ('equality', 'residue')");
  await check('revisions', 'place', "(kind = 'residue') = (place IS NOT NULL AND value IS NOT NULL)");
  await queryInterface.addIndex('revisions', ['identity_id', 'number'], { name: 'revisions_number', unique: true });

  await queryInterface.createTable('checks', {
    id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
    revision_id: to('revisions', 'CASCADE'),
    verdict: text,
    // The whole answer of the engine, or why there is none.
    evidence: { type: DataTypes.JSONB, allowNull: false },
    engine: text,
    duration_ms: count,
    created_at: moment,
  });
  await check('checks', 'verdict', `verdict IN ${verdicts}`);
  await queryInterface.addIndex('checks', ['revision_id', 'id'], { name: 'checks_revision' });

  // An answer that was given under a key of the caller's is given again to the same request.
  await queryInterface.createTable('idempotency_keys', {
    user_id: { ...to('users', 'CASCADE'), primaryKey: true },
    group_id: { ...to('groups', 'CASCADE'), primaryKey: true },
    key: { type: DataTypes.TEXT, primaryKey: true },
    request_digest: text,
    // The identity that was made; empty while it is being made.
    identity_id: { ...to('identities', 'CASCADE'), allowNull: true },
    created_at: moment,
  });
}

export async function down({ context: queryInterface }) {
  for (const table of ['idempotency_keys', 'checks', 'revisions', 'identities']) await queryInterface.dropTable(table);
}
