import { bitLength } from '../arith/bits';
import { factorOverFinite } from './factor-finite';
import { factorPrimitive } from './factor-rational';
import { multiplyIntegers, primitivePart, type IntegerPolynomial } from './integer-polynomial';
import {
  coefficientsIn,
  collected,
  degreeIn,
  isConstant,
  lettersIn,
  type LetterRing,
  type MultiPolynomial,
} from './multivariate';
import { exactQuotient, normalized } from './multivariate-division';
import { contentIn } from './multivariate-gcd';
import { primeField } from './prime-field';

/** Images in one letter up to this degree are factored, and so many factors of an image are combined. */
const IMAGE_DEGREE = 160;
const IMAGE_FACTORS = 20;
/** With no more of them than this an image is good enough; otherwise others are looked at. */
const FEW_FACTORS = 8;
/** So many products of factors of an image are tested. */
const TRIALS = 2_500;
/** Numbers that stand for coefficients in other letters have at most this many digits to their large base. */
const DIGITS = 64;

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
 * All letters but one are replaced so that no term is lost: over ℤ by powers of a large number, over 𝔽_p by powers of the one letter
 * (L. Kronecker's substitution: D. Knuth, The Art of Computer Programming 2, section 4.6.2). A factor is seen as a product of
 * factors of this image, written back, and tested by division. That a polynomial is irreducible is mostly seen sooner, at
 * an image in one letter of the same degree.
 */
export function factorsOf(ring: LetterRing, f: MultiPolynomial): readonly MultiPolynomial[] {
  const letters = lettersIn(ring, f);
  if (letters.length > 1 && isSeenIrreducible(ring, f, letters)) return [f];
  const image =
    ring.characteristic === 0n
      ? factored(ring, numberImage(ring, f, letters))
      : ordersOf(letters)
          .map((order) => () => factored(ring, letterImage(ring, f, order)))
          .reduce<FactoredImage | undefined>((best, next) => {
            if (best !== undefined && best.pieces.length <= FEW_FACTORS) return best;
            const found = next();
            return best === undefined || (found && found.pieces.length < best.pieces.length) ? found : best;
          }, undefined);
  if (image === undefined) return [f];
  let { pieces } = image;
  const found: MultiPolynomial[] = [];
  let rest = f;
  const trials = { left: TRIALS };
  for (let size = 1; 2 * size <= pieces.length && trials.left > 0;) {
    const divisor = firstDivisor(ring, rest, image, pieces, size, trials);
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

/** An image with its irreducible factors, `undefined` where they are too many to be combined. */
function factored(ring: LetterRing, image: Image | undefined): FactoredImage | undefined {
  if (image === undefined) return undefined;
  const pieces = factorImage(ring, image.of);
  return pieces.length > IMAGE_FACTORS ? undefined : { ...image, pieces };
}

/** Letters in some of their orders: over 𝔽_p each gives another image, which may have fewer factors. */
const ordersOf = (letters: readonly number[]): readonly (readonly number[])[] =>
  letters.flatMap((_, i) => {
    const turned = [...letters.slice(i), ...letters.slice(0, i)];
    return letters.length > 2 ? [turned, [...turned].reverse()] : [turned];
  });

interface FactoredImage extends Image {
  readonly pieces: readonly IntegerPolynomial[];
}

/** An image in one letter, and what a product of its factors comes from if it comes from a factor. */
interface Image {
  readonly of: IntegerPolynomial;
  preimage(product: IntegerPolynomial): MultiPolynomial | undefined;
}

/** Over 𝔽_p: all letters are powers of one. */
function letterImage(ring: LetterRing, f: MultiPolynomial, letters: readonly number[]): Image | undefined {
  const places = packed(letters.map((letter) => ({ letter, room: degreeIn(f, letter) + 1 })));
  if (places.size - 1 > IMAGE_DEGREE) return undefined;
  return { of: imageOf(places, f), preimage: (product) => unpacked(ring, places, product) };
}

/**
 * Over ℤ: a letter of least degree is kept, the others are powers of a number so large that coefficients are read off as its digits.
 * A factor g of f = gh is found as lc(h)·g, of which the image is known up to nothing: lc(f) over the leading coefficient of
 * the product, times the product.
 */
function numberImage(ring: LetterRing, f: MultiPolynomial, letters: readonly number[]): Image | undefined {
  const kept = letters.reduce((best, next) => (degreeIn(f, next) < degreeIn(f, best) ? next : best));
  const others = letters.filter((letter) => letter !== kept);
  const places = packed(others.map((letter) => ({ letter, room: degreeIn(f, letter) + 1 })));
  if (degreeIn(f, kept) > IMAGE_DEGREE || places.size > DIGITS) return undefined;
  const longest = f.reduce((most, { coefficient }) => Math.max(most, bitLength(coefficient)), 0);
  const base = 1n << BigInt(4 * longest + 8 * letters.length * degreeIn(f, kept) + 24);
  const image = [...coefficientsIn(f, kept)].reduce<bigint[]>(
    (list, [e, coefficient]) => {
      list[e] = imageOf(places, coefficient).reduceRight((value, digit) => value * base + digit, 0n);
      return list;
    },
    new Array<bigint>(degreeIn(f, kept) + 1).fill(0n),
  );
  const lead = image.at(-1) ?? 1n;
  const of = primitivePart(image);
  return {
    of,
    preimage(product) {
      const own = product.at(-1) ?? 1n;
      if (product.some((c) => (c * lead) % own !== 0n)) return undefined;
      const terms = product.flatMap((c, e) =>
        unpacked(ring, places, digitsOf((c * lead) / own, base)).map(({ exponents, coefficient }) => ({
          exponents: exponents.map((x, i) => (i === kept ? e : x)),
          coefficient,
        })),
      );
      const whole = collected(ring, terms);
      if (whole.length === 0) return undefined;
      const primitive = normalized(ring, whole).primitive;
      return exactQuotient(ring, primitive, contentIn(ring, primitive, kept));
    },
  };
}

/** The digits of a number to a base, of least size: −base/2 < digit ≤ base/2; from the lowest up. */
function digitsOf(n: bigint, base: bigint): readonly bigint[] {
  const digits: bigint[] = [];
  for (let rest = n; rest !== 0n;) {
    let digit = ((rest % base) + base) % base;
    if (2n * digit > base) digit -= base;
    digits.push(digit);
    rest = (rest - digit) / base;
  }
  return digits;
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

const unpacked = (ring: LetterRing, { letters }: Places, image: readonly bigint[]): MultiPolynomial =>
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
      ? factorPrimitive(image, ring.budget, doing)
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
    return factorImage(ring, primitivePart(imageOf(places, image))).length === 1;
  });
}

interface Divisor {
  readonly factor: MultiPolynomial;
  readonly quotient: MultiPolynomial;
  readonly used: readonly number[];
}

function firstDivisor(
  ring: LetterRing,
  f: MultiPolynomial,
  image: Image,
  pieces: readonly IntegerPolynomial[],
  size: number,
  trials: { left: number },
): Divisor | undefined {
  for (const used of choices(pieces.length, size)) {
    trials.left -= 1;
    if (trials.left < 0) return undefined;
    ring.budget.spend('factoring a polynomial in several letters');
    const candidate = image.preimage(used.map((i) => pieces[i] ?? [1n]).reduce(multiplyIntegers));
    if (candidate === undefined || isConstant(candidate)) continue;
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
