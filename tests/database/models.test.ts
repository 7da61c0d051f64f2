import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Sequelize } from 'sequelize';
import { connect } from '@/lib/database/connection';
import { ownDatabase } from '../harness/own-database';

const url = ownDatabase();
let database: Sequelize;

beforeAll(() => {
  database = connect(url(), 2);
});
afterAll(() => database.close());

test('every model has exactly the columns of its table', async () => {
  for (const model of Object.values(database.models)) {
    const table = await database.getQueryInterface().describeTable(model.getTableName());
    const declared = Object.values(model.getAttributes()).map((attribute) => ({
      column: attribute.field,
      required: attribute.allowNull === false || attribute.primaryKey === true,
      key: attribute.primaryKey === true,
    }));
    const there = Object.entries(table).map(([column, { allowNull, primaryKey }]) => ({
      column,
      required: !allowNull,
      key: primaryKey,
    }));
    expect(
      declared.sort((a, b) => String(a.column).localeCompare(String(b.column))),
      model.name,
    ).toEqual(there.sort((a, b) => a.column.localeCompare(b.column)));
  }
});
