import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { etaFactors, multiple, symbolFactors, total } from '../ring/write-word';

/** A letter of a word: η or a symbol of an atom, that is of an entry in a form rules can take apart. */
export type Letter<A> = { readonly kind: 'eta' } | { readonly kind: 'symbol'; readonly atom: A };

/** A word of the free ring with its coefficient, which is not zero. */
export interface Word<A> {
  readonly coefficient: bigint;
  readonly letters: readonly Letter<A>[];
}

/** An integer combination of words, equal words collected. */
export type Combination<A> = readonly Word<A>[];

/** What writing and collecting need to know of atoms. */
export interface Atoms<A> {
  /** Equal keys mean equal elements of the field. */
  key(atom: A): string;
  write(atom: A): Element;
}

export const etaLetter = { kind: 'eta' } as const;

export const symbolLetter = <A>(atom: A): Letter<A> => ({ kind: 'symbol', atom });

/** Collects equal words; they keep the order in which they first occur. */
export function collect<A>(atoms: Atoms<A>, words: readonly Word<A>[]): Combination<A> {
  const collected = new Map<string, Word<A>>();
  for (const word of words) {
    const key = word.letters.map((letter) => (letter.kind === 'eta' ? 'η' : `[${atoms.key(letter.atom)}]`)).join('');
    const present = collected.get(key);
    const coefficient = (present?.coefficient ?? 0n) + word.coefficient;
    collected.set(key, { coefficient, letters: word.letters });
  }
  return [...collected.values()].filter(({ coefficient }) => coefficient !== 0n);
}

/** The combination as an expression: runs of one letter as powers. */
export function writeCombination<A>(atoms: Atoms<A>, words: Combination<A>): Expression {
  return total(
    words.map(({ coefficient, letters }) => {
      const factors: Expression[] = [];
      for (let i = 0; i < letters.length;) {
        const letter = letters[i];
        if (letter === undefined) break;
        let run = 1;
        while (i + run < letters.length && sameLetter(atoms, letter, letters[i + run])) run += 1;
        factors.push(...(letter.kind === 'eta' ? etaFactors(run) : symbolFactors(atoms.write(letter.atom), run)));
        i += run;
      }
      return multiple(coefficient, factors);
    }),
  );
}

function sameLetter<A>(atoms: Atoms<A>, a: Letter<A>, b: Letter<A> | undefined): boolean {
  if (b === undefined || a.kind === 'eta' || b.kind === 'eta') return b !== undefined && a.kind === b.kind;
  return atoms.key(a.atom) === atoms.key(b.atom);
}
