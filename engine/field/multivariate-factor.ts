import { factorOverFinite } from './factor-finite';
import { factorPrimitive } from './factor-rational';
import { multiplyIntegers, type IntegerPolynomial } from './integer-polynomial';
import { collected, degreeIn, isConstant, lettersIn, type LetterRing, type MultiPolynomial } from './multivariate';
import { exactQuotient, normalized } from './multivariate-division';
import { primeField } from './prime-field';

/** Images in one letter up to this degree are factored, and so many factors of an image are combined. */
const IMAGE_DEGREE = 48;
const IMAGE_FACTORS = 12;

/** Values that are put for all letters but one, to see that a polynomial is irreducible. */
const TRIAL_VALUES: readonly (readonly bigint[])[] = [
  [2n, 3n, 5n, 7n],
  [3n, 7n, 2n, 11n],
  [-2n, 5n, -3n, 4n],
];

/**
 * The irreducible factors of a normalized polynomial that has no repeated factor and is primitive in each of its letters, as far as
 * they are found at little cost: otherwise the polynomial itself.
 *
 * In one letter by factoring; in more by L. Kronecker's substitution x_i ↦ z^(D_i), under which polynomials of bounded degree keep
 * all their terms: a factor is seen as a product of factors of the image, and tested by division (D. Knuth, The Art of
 * Computer Programming 2, section 4.6.2). That a polynomial is irreducible is mostly seen sooner, at an image in one letter
 * of the same degree.
 */
export function factorsOf(ring: LetterRing, f: MultiPolynomial): readonly MultiPolynomial[] {
  const letters = lettersIn(ring, f);
  const places = packed(letters.map((letter) => ({ letter, room: degreeIn(f, letter) + 1 })));
  if (places.size - 1 > IMAGE_DEGREE) return [f];
  if (letters.length === 1) return factorImage(ring, imageOf(places, f)).map((g) => preimage(ring, places, g));
  return isSeenIrreducible(ring, f, letters) ? [f] : combined(ring, f, places);
}

/** Where the monomials of bounded degrees go under Kronecker's substitution: mixed radix numbers. */
interface Places {
  readonly letters: readonly { readonly letter: number; readonly room: number; readonly step: number }[];
  readonly size: number;
}

function packed(letters: readonly { readonly letter: number; readonly room: number }[]): Places {
  let size = 1;
  const stepped = letters.map(({ letter, room }) => {
    const step = size;
    size *= room;
    return { letter, room, step };
  });
  return { letters: stepped, size };
}

function imageOf({ letters, size }: Places, f: MultiPolynomial): IntegerPolynomial {
  const image = new Array<bigint>(size).fill(0n);
  for (const { exponents, coefficient } of f)
    image[letters.reduce((at, { letter, step }) => at + step * (exponents[letter] ?? 0), 0)] = coefficient;
  return withoutZeros(image);
}

const preimage = (ring: LetterRing, { letters }: Places, image: IntegerPolynomial): MultiPolynomial =>
  collected(
    ring,
    image.map((coefficient, at) => {
      const exponents = ring.letters.map(() => 0);
      let rest = at;
      for (const { letter, room } of letters) {
        exponents[letter] = rest % room;
        rest = (rest - (rest % room)) / room;
      }
      return { exponents, coefficient };
    }),
  );

function withoutZeros(image: bigint[]): IntegerPolynomial {
  while (image.length > 0 && image[image.length - 1] === 0n) image.pop();
  return image;
}

/** The irreducible factors of an image, each as often as it divides. */
function factorImage(ring: LetterRing, image: IntegerPolynomial): readonly IntegerPolynomial[] {
  const doing = 'factoring a polynomial in several letters';
  const powers =
    ring.characteristic === 0n
      ? factorPrimitive(image.at(-1)! < 0n ? image.map((c) => -c) : image, ring.budget, doing)
      : factorOverFinite(primeField(ring.characteristic), image, ring.budget, doing).factors;
  return powers.flatMap(({ factor, exponent }) => new Array<IntegerPolynomial>(exponent).fill(factor));
}

/** Whether an image in one letter, of the same degree, is irreducible. */
function isSeenIrreducible(ring: LetterRing, f: MultiPolynomial, letters: readonly number[]): boolean {
  if (ring.characteristic !== 0n && ring.characteristic < 20n) return false;
  const letter = letters.reduce((best, next) => (degreeIn(f, next) < degreeIn(f, best) ? next : best));
  return TRIAL_VALUES.some((values) => {
    const at = (exponents: readonly number[]): bigint =>
      exponents.reduce((c, e, i) => (i === letter ? c : c * (values[i % values.length] ?? 1n) ** BigInt(e)), 1n);
    const image = collected(
      ring,
      f.map(({ exponents, coefficient }) => ({
        exponents: exponents.map((e, i) => (i === letter ? e : 0)),
        coefficient: coefficient * at(exponents),
      })),
    );
    if (degreeIn(image, letter) !== degreeIn(f, letter)) return false;
    const places = packed([{ letter, room: degreeIn(f, letter) + 1 }]);
    return factorImage(ring, imageOf(places, normalized(ring, image).primitive)).length === 1;
  });
}

/** Factors found as products of factors of the image, products of few first. */
function combined(ring: LetterRing, f: MultiPolynomial, places: Places): readonly MultiPolynomial[] {
  let pieces = factorImage(ring, imageOf(places, f));
  if (pieces.length > IMAGE_FACTORS) return [f];
  const found: MultiPolynomial[] = [];
  let rest = f;
  for (let size = 1; 2 * size <= pieces.length;) {
    const divisor = firstDivisor(ring, rest, places, pieces, size);
    if (divisor === undefined) {
      size += 1;
      continue;
    }
    found.push(divisor.factor);
    rest = divisor.quotient;
    pieces = pieces.filter((_, i) => !divisor.used.includes(i));
  }
  return isConstant(rest) ? found : [...found, normalized(ring, rest).primitive];
}

interface Divisor {
  readonly factor: MultiPolynomial;
  readonly quotient: MultiPolynomial;
  readonly used: readonly number[];
}

function firstDivisor(
  ring: LetterRing,
  f: MultiPolynomial,
  places: Places,
  pieces: readonly IntegerPolynomial[],
  size: number,
): Divisor | undefined {
  for (const used of choices(pieces.length, size)) {
    ring.budget.spend('factoring a polynomial in several letters');
    const image = used.map((i) => pieces[i] ?? [1n]).reduce(multiplyIntegers);
    const candidate = preimage(ring, places, image);
    if (isConstant(candidate)) continue;
    const factor = normalized(ring, candidate).primitive;
    const quotient = exactQuotient(ring, f, factor);
    if (quotient !== undefined && !isConstant(quotient)) return { factor, quotient, used };
  }
  return undefined;
}

/** The sets of `size` of the numbers 0 … count − 1, in order. */
function* choices(count: number, size: number, from = 0): Generator<readonly number[]> {
  if (size === 0) {
    yield [];
    return;
  }
  for (let first = from; first <= count - size; first += 1)
    for (const rest of choices(count, size - 1, first + 1)) yield [first, ...rest];
}
