import type { FiniteField } from '../field/field';
import { etaFirst } from './canonical-rules';
import type { Atoms, Word } from './combination';
import type { Rule } from './rule';

/** Units of a finite field as the atoms of words. */
export function unitAtoms<E>(field: FiniteField<E>): Atoms<E> {
  return { key: (unit) => field.index(unit).toString(), write: (unit) => field.write(unit) };
}

/**
 * The oriented relations over 𝔽_q: η to the front, [1] = 0, words with two symbols vanish since K^MW_2(𝔽_q) = 0 (J. Milnor,
 * Introduction to Algebraic K-Theory, 9.9, and I² = 0), and beside η a unit counts by its square class.
 */
export function finiteRules<E>(field: FiniteField<E>): readonly Rule<E>[] {
  const symbols = (word: Word<E>): readonly E[] => word.letters.flatMap((l) => (l.kind === 'symbol' ? [l.atom] : []));
  const one: Rule<E> = {
    measure: 'words with the letter [1]',
    next: (words) => {
      const hasOne = (word: Word<E>): boolean => symbols(word).some((unit) => field.equal(unit, field.one));
      return words.some(hasOne)
        ? { relation: 'one', args: [], rewrite: (w) => (hasOne(w) ? [] : undefined) }
        : undefined;
    },
  };
  const second: Rule<E> = {
    measure: 'words with two symbols',
    next: (words) => {
      const two = (word: Word<E>): boolean => symbols(word).length > 1;
      return words.some(two)
        ? { relation: 'secondDegree', args: [], rewrite: (w) => (two(w) ? [] : undefined) }
        : undefined;
    },
  };
  const squares: Rule<E> = {
    measure: 'units beside η other than the least non-square',
    next: (words) => {
      const rewrite = (word: Word<E>): readonly Word<E>[] | undefined => {
        const [unit] = symbols(word);
        if (unit === undefined || word.letters[0]?.kind !== 'eta') return undefined;
        if (field.isSquare(unit)) return [];
        if (field.nonSquare === undefined || field.equal(unit, field.nonSquare)) return undefined;
        const s = field.nonSquare;
        return [{ ...word, letters: word.letters.map((l) => (l.kind === 'eta' ? l : { kind: 'symbol', atom: s })) }];
      };
      return words.some((word) => rewrite(word)) ? { relation: 'squares', args: [], rewrite } : undefined;
    },
  };
  return [etaFirst(), one, second, squares];
}
