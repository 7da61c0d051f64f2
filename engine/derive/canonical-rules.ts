import { epsilonMultiple } from '../ring/sign-ring';
import { etaLetter, symbolLetter, type Combination, type Letter, type Word } from './combination';
import type { Atoms } from './combination';
import { splice, type Application, type Rule } from './rule';

/** Atoms that are ± products of powers of ordered generators. */
export interface FactoredAtoms<A> extends Atoms<A> {
  readonly minusOne: A;
  /** The factors −1 (if the sign is negative) and gᵉ in the order of the generators; none for 1. */
  factors(atom: A): readonly { readonly atom: A; readonly generator: A; readonly exponent: bigint }[];
  product(a: A, b: A): A;
  /** The order in which symbols of generators stand in a canonical word; −1 comes first. */
  compare(a: A, b: A): number;
}

/**
 * The oriented relations that bring any combination to canonical words (math: F. Morel, LNM 2052, Lemmas 3.5–3.14): η to the front,
 * entries taken apart into generators, symbols sorted, repetitions and [−1] beside η removed.
 */
export function canonicalRules<A>(atoms: FactoredAtoms<A>): readonly Rule<A>[] {
  const isMinusOne = (letter: Letter<A>): boolean => letter.kind === 'symbol' && same(letter.atom, atoms.minusOne);
  const same = (a: A, b: A): boolean => atoms.key(a) === atoms.key(b);
  const find = (words: Combination<A>, test: (word: Word<A>) => number): { word: Word<A>; at: number } | undefined => {
    for (const word of words) {
      const at = test(word);
      if (at >= 0) return { word, at };
    }
    return undefined;
  };
  const atomAt = (word: Word<A>, at: number): A | undefined => {
    const letter = word.letters[at];
    return letter?.kind === 'symbol' ? letter.atom : undefined;
  };

  const one: Rule<A> = {
    measure: 'words with the letter [1]',
    next(words) {
      const at = (word: Word<A>): number =>
        word.letters.findIndex((letter) => letter.kind === 'symbol' && atoms.factors(letter.atom).length === 0);
      return find(words, at) && { relation: 'one', args: [], rewrite: (word) => (at(word) >= 0 ? [] : undefined) };
    },
  };

  const split: Rule<A> = {
    measure: 'the number of factors of entries, then the size of exponents',
    next(words) {
      const at = (word: Word<A>): number =>
        word.letters.findIndex((letter) => letter.kind === 'symbol' && !isGenerator(letter.atom));
      const found = find(words, at);
      const atom = found && atomAt(found.word, found.at);
      if (atom === undefined) return undefined;
      const [first, ...rest] = atoms.factors(atom);
      if (first === undefined) return undefined;
      const where = (word: Word<A>): number =>
        word.letters.findIndex((letter) => letter.kind === 'symbol' && same(letter.atom, atom));
      const replace = (pieces: Parameters<typeof splice<A>>[3]) => (word: Word<A>) => {
        const i = where(word);
        return i < 0 ? undefined : splice(word, i, 1, pieces);
      };
      if (rest.length === 0) {
        const { x, y } = epsilonMultiple(first.exponent);
        const pieces = [
          { coefficient: x, letters: [symbolLetter(first.generator)] },
          { coefficient: y, letters: [etaLetter, symbolLetter(atoms.minusOne), symbolLetter(first.generator)] },
        ];
        return {
          relation: 'power',
          args: [first.generator],
          rewrite: replace(pieces.filter(({ coefficient }) => coefficient !== 0n)),
        };
      }
      const other = rest.map((factor) => factor.atom).reduce((a, b) => atoms.product(a, b));
      return {
        relation: 'additivity',
        args: [first.atom, other],
        rewrite: replace([
          { coefficient: 1n, letters: [symbolLetter(first.atom)] },
          { coefficient: 1n, letters: [symbolLetter(other)] },
          { coefficient: 1n, letters: [etaLetter, symbolLetter(first.atom), symbolLetter(other)] },
        ]),
      };
    },
  };
  const isGenerator = (atom: A): boolean => {
    const factors = atoms.factors(atom);
    const [first] = factors;
    return factors.length === 1 && first !== undefined && first.exponent === 1n;
  };

  const repeat: Rule<A> = {
    measure: 'symbols other than [−1]',
    next(words) {
      const at = (word: Word<A>): number =>
        word.letters.findIndex((letter, i) => {
          const [a, b] = [atomAt(word, i), atomAt(word, i + 1)];
          return letter.kind === 'symbol' && a !== undefined && b !== undefined && same(a, b) && !isMinusOne(letter);
        });
      const found = find(words, at);
      const atom = found && atomAt(found.word, found.at);
      if (atom === undefined) return undefined;
      return {
        relation: 'repetition',
        args: [atom],
        rewrite: (word) => {
          const i = at(word);
          const here = atomAt(word, i);
          if (here === undefined || !same(here, atom)) return undefined;
          return splice(word, i, 2, [{ coefficient: 1n, letters: [symbolLetter(atoms.minusOne), symbolLetter(atom)] }]);
        },
      };
    },
  };

  /** Sorts neighbours: [−1] past a symbol, or any two beside η, without a sign; two others at the price of ε. */
  const sorting = (only: 'minusOne' | 'any'): Rule<A> => ({
    measure: 'pairs of symbols that stand in the wrong order',
    next(words) {
      const wrong = (word: Word<A>): number =>
        word.letters.findIndex((_, i) => {
          const [a, b] = [atomAt(word, i), atomAt(word, i + 1)];
          if (a === undefined || b === undefined || atoms.compare(a, b) <= 0) return false;
          return only === 'any' || same(b, atoms.minusOne);
        });
      const found = find(words, wrong);
      const [a, b] = found ? [atomAt(found.word, found.at), atomAt(found.word, found.at + 1)] : [];
      if (a === undefined || b === undefined) return undefined;
      const swapped = [symbolLetter(b), symbolLetter(a)];
      const plain = [{ coefficient: 1n, letters: swapped }];
      const twisted = [
        { coefficient: -1n, letters: swapped },
        { coefficient: -1n, letters: [etaLetter, symbolLetter(atoms.minusOne), ...swapped] },
      ];
      return {
        relation: 'commutativity',
        args: [a, b],
        rewrite: (word) => {
          const i = word.letters.findIndex((_, k) => {
            const [x, y] = [atomAt(word, k), atomAt(word, k + 1)];
            return x !== undefined && y !== undefined && same(x, a) && same(y, b);
          });
          if (i < 0) return undefined;
          return splice(word, i, 2, same(b, atoms.minusOne) || word.letters[0]?.kind === 'eta' ? plain : twisted);
        },
      };
    },
  });

  const etaH: Rule<A> = {
    measure: 'the length of words',
    next(words) {
      const rewrite: Application<A>['rewrite'] = ({ coefficient, letters }) => {
        const etas = letters.filter((letter) => letter.kind === 'eta').length;
        const minusOnes = letters.filter(isMinusOne).length;
        if (etas < 1 || minusOnes < 1 || etas + minusOnes < 3) return undefined;
        const at = letters.findIndex(isMinusOne);
        return [{ coefficient: -2n * coefficient, letters: letters.filter((_, i) => i !== 0 && i !== at) }];
      };
      return words.some((word) => rewrite(word)) ? { relation: 'etaH', args: [], rewrite } : undefined;
    },
  };

  return [etaFirst(), one, split, sorting('minusOne'), etaH, repeat, sorting('any')];
}

/** η to the front of every word. */
export function etaFirst<A>(): Rule<A> {
  return {
    measure: 'symbols in front of some η',
    next(words) {
      const rewrite: Application<A>['rewrite'] = (word) => {
        const last = word.letters.map((letter) => letter.kind).lastIndexOf('eta');
        if (word.letters.slice(0, last + 1).every((letter) => letter.kind === 'eta')) return undefined;
        const [etas, symbols] = [true, false].map((eta) =>
          word.letters.filter((letter) => (letter.kind === 'eta') === eta),
        );
        return [{ coefficient: word.coefficient, letters: [...(etas ?? []), ...(symbols ?? [])] }];
      };
      return words.some((word) => rewrite(word)) ? { relation: 'etaCommutation', args: [], rewrite } : undefined;
    },
  };
}
