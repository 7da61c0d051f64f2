import {
  integerElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  type Element,
} from '../expression/element';
import type { Word } from './combination';
import type { FactoredAtoms } from './canonical-rules';

/** ± a product of powers of generators, by the index of the generator; exponents are not 0 and stand in the order of the index. */
export interface FactoredAtom {
  readonly negative: boolean;
  readonly powers: readonly (readonly [generator: number, exponent: bigint])[];
}

/** Atoms over a list of generators; `joined` says that they are written as one number where they are integers. */
export function factoredAtoms(generators: readonly Element[]): FactoredAtoms<FactoredAtom> {
  const key = ({ negative, powers }: FactoredAtom): string =>
    `${negative ? '-' : ''}${powers.map(([g, e]) => `${g}^${e}`).join('*')}`;
  return {
    key,
    write: (atom) => writeAtom(generators, atom),
    minusOne: { negative: true, powers: [] },
    factors: ({ negative, powers }) => [
      ...(negative ? [{ atom: sign, generator: sign, exponent: 1n }] : []),
      ...powers.map(([g, exponent]) => ({
        atom: { negative: false, powers: [[g, exponent] as const] },
        generator: { negative: false, powers: [[g, 1n] as const] },
        exponent,
      })),
    ],
    product(a, b) {
      const exponents = new Map(a.powers);
      for (const [g, e] of b.powers) exponents.set(g, (exponents.get(g) ?? 0n) + e);
      return {
        negative: a.negative !== b.negative,
        powers: [...exponents].filter(([, e]) => e !== 0n).sort(([x], [y]) => x - y),
      };
    },
    compare: (a, b) => rank(a) - rank(b),
  };
}

const sign: FactoredAtom = { negative: true, powers: [] };

const rank = ({ powers }: FactoredAtom): number => powers[0]?.[0] ?? -1;

function writeAtom(generators: readonly Element[], { negative, powers }: FactoredAtom): Element {
  const side = (wanted: boolean): Element | undefined => {
    const parts = powers
      .filter(([, e]) => e > 0n === wanted)
      .map(([g, e]) => factor(generators[g] ?? one, e < 0n ? -e : e));
    if (parts.length === 0) return undefined;
    const whole = parts.reduce<bigint | undefined>(
      (n, part) => (n !== undefined && part.kind === 'integer' ? n * part.value : undefined),
      1n,
    );
    if (whole !== undefined) return integerElement(whole);
    return parts.length === 1 && parts[0] ? parts[0] : productElement(parts);
  };
  const [above, below] = [side(true), side(false)];
  const size = below === undefined ? (above ?? one) : quotientElement(above ?? one, below);
  return negative ? negateElement(size) : size;
}

const one = integerElement(1n);

/** Integers are multiplied out as long as the number stays short. */
function factor(generator: Element, exponent: bigint): Element {
  if (generator.kind === 'integer' && exponent <= 64n) return integerElement(generator.value ** exponent);
  return exponent === 1n ? generator : powerElement(generator, Number(exponent));
}

/** Words by degree, highest first, then by their generators: fewer first, then in order; words with η[−1] last. */
export function compareCanonicalWords(a: Word<FactoredAtom>, b: Word<FactoredAtom>): number {
  const degree = (word: Word<FactoredAtom>): number =>
    word.letters.reduce((sum, letter) => sum + (letter.kind === 'eta' ? -1 : 1), 0);
  const generators = (word: Word<FactoredAtom>): readonly number[] =>
    word.letters.flatMap((letter) => (letter.kind === 'symbol' ? (letter.atom.powers[0]?.[0] ?? []) : []));
  const [x, y] = [generators(a), generators(b)];
  const at = x.findIndex((g, i) => g !== y[i]);
  return (
    degree(b) - degree(a) ||
    x.length - y.length ||
    (at < 0 ? 0 : (x[at] ?? 0) - (y[at] ?? 0)) ||
    a.letters.length - b.letters.length
  );
}
