import { DataTypes } from 'sequelize';

// A revision never changes, so what it says is set once and not again at every look. Empty where it was not set yet.
export const up = ({ context: queryInterface }) =>
  queryInterface.addColumn('revisions', 'typeset', { type: DataTypes.JSONB });

export const down = ({ context: queryInterface }) => queryInterface.removeColumn('revisions', 'typeset');
