import { UniqueConstraintError } from 'sequelize';

/** The unique constraint or index an error of the database is about, or undefined for any other error. */
export function brokenConstraint(error: unknown): string | undefined {
  if (!(error instanceof UniqueConstraintError)) return undefined;
  const { parent } = error as { parent: { constraint?: string } };
  return parent.constraint;
}
