import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { lower } from '../ring/lower';
import type { Term } from '../ring/term';
import { etaLetter, symbolLetter, type Letter, type Word } from './combination';

/** More words than this are not written out. */
export const DERIVATION_WORDS = 400;

/** Thrown inside a derivation that gets too long to read; nothing but the derivation is lost. */
export class TooLong extends Error {}

/**
 * An expression multiplied out by the definitions ⟨a⟩ = 1 + η[a], ⟪a⟫ = −η[a], h = 2 + η[−1], ε = −1 − η[−1] and n_ε, as a list
 * of words that is not collected. Throws TooLong past `DERIVATION_WORDS`.
 */
export function expand<A>(expression: Expression, read: (entry: Element) => A): readonly Word<A>[] {
  return expandTerms(lower(expression, read));
}

function expandTerms<A>(terms: readonly Term<A>[]): readonly Word<A>[] {
  const words = terms.flatMap((term) => expandTerm(term));
  if (words.length > DERIVATION_WORDS) throw new TooLong();
  return words;
}

function expandTerm<A>(term: Term<A>): readonly Word<A>[] {
  const etas: Letter<A>[] = new Array<Letter<A>>(Math.min(term.eta, DERIVATION_WORDS + 1)).fill(etaLetter);
  if (etas.length > DERIVATION_WORDS) throw new TooLong();
  let words: readonly Word<A>[] = [{ coefficient: BigInt(term.coefficient), letters: etas }];
  for (const entry of term.angles)
    words = multiply(words, [
      { coefficient: 1n, letters: [] },
      { coefficient: 1n, letters: [etaLetter, symbolLetter(entry)] },
    ]);
  for (const factor of term.factors) {
    if (factor.kind === 'symbol') words = multiply(words, [{ coefficient: 1n, letters: [symbolLetter(factor.entry)] }]);
    else {
      const inner = expandTerms(factor.of);
      for (let i = 0; i < factor.exponent; i += 1) words = multiply(words, inner);
    }
  }
  return words;
}

function multiply<A>(left: readonly Word<A>[], right: readonly Word<A>[]): readonly Word<A>[] {
  if (left.length * right.length > DERIVATION_WORDS) throw new TooLong();
  return left.flatMap((x) =>
    right.map((y) => ({ coefficient: x.coefficient * y.coefficient, letters: [...x.letters, ...y.letters] })),
  );
}
