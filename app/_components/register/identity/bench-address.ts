import type { IdentityAnswer } from '@/lib/contracts/identity-answer';

/** The bench with what an identity says in its line; of a residue its class. */
export function benchHref({ field, statement, hypotheses }: IdentityAnswer): string {
  const line = [statement.text, ...hypotheses.map(({ text }) => text)].join('; ');
  return `/bench?${new URLSearchParams({ field: field.text, statement: line }).toString()}`;
}
