import type { Budget } from '../arith/budget';
import { canonicalRules } from '../derive/canonical-rules';
import { derivation } from '../derive/derivation';
import { compareCanonicalWords, factoredAtoms, type FactoredAtom } from '../derive/factored-atoms';
import type { DerivationStep } from '../derive/rule';
import { integerElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { rationals } from '../field/rational';
import { exponentMap, rationalEntries, type RationalEntry } from '../place/rational-entry';
import { see } from '../place/sight';
import { lower } from '../ring/lower';
import { unitReader } from './read-unit';

/** The derivation of a canonical form for words with rational entries: down to words in primes, then by `conclusion`. */
export function rationalDerivation(
  expression: Expression,
  form: Expression,
  conclusion: string,
  budget: Budget,
): readonly DerivationStep[] | undefined {
  return derivation<FactoredAtom>(
    expression,
    form,
    () => {
      const entries = rationalEntries();
      const read = unitReader(rationals, budget);
      const intern = (entry: Element): RationalEntry => entries.intern(read(entry), entry.at);
      lower(expression, intern);
      const base = see(entries.all(), 'all', budget);
      const atoms = factoredAtoms(base.map(({ value }) => integerElement(value)));
      return {
        atoms,
        rules: canonicalRules(atoms),
        read: (entry) => atomOf(intern(entry)),
        compareWords: compareCanonicalWords,
        conclusion,
      };
    },
    budget,
  );
}

const atomOf = (entry: RationalEntry): FactoredAtom => ({
  negative: entry.negative,
  powers: [...exponentMap(entry)].map(([g, e]) => [g, BigInt(e)] as const).sort(([a], [b]) => a - b),
});
