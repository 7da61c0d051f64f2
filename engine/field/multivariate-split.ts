import {
  derivativeIn,
  degreeIn,
  isConstant,
  keyOf,
  lettersIn,
  type LetterRing,
  type MultiPolynomial,
} from './multivariate';
import { coprimeBaseMulti } from './multivariate-base';
import { exactQuotient } from './multivariate-division';
import { factorsOf } from './multivariate-factor';
import { contentIn, gcdMulti } from './multivariate-gcd';

/**
 * A finer coprime base: every member is primitive in each of its letters, so that one of degree 1 in some letter is irreducible;
 * repeated factors, as far as derivatives show them, and factors that are found at little cost are taken apart.
 */
export function splitBase(ring: LetterRing, polynomials: Iterable<MultiPolynomial>): readonly MultiPolynomial[] {
  const done = known.get(ring.letters) ?? new Map<string, readonly MultiPolynomial[]>();
  known.set(ring.letters, done);
  return coprimeBaseMulti(ring, polynomials).flatMap((f) => {
    const key = `${ring.characteristic} ${keyOf(f)}`;
    const parts = done.get(key) ?? split(ring, f);
    done.set(key, parts);
    return parts;
  });
}

/** What was split before, by the letters of a question: the same polynomials come up at many places. */
const known = new WeakMap<readonly string[], Map<string, readonly MultiPolynomial[]>>();

function split(ring: LetterRing, f: MultiPolynomial): readonly MultiPolynomial[] {
  const letters = lettersIn(ring, f);
  for (const letter of letters) {
    const content = contentIn(ring, f, letter);
    if (!isConstant(content)) return parted(ring, f, content);
  }
  if (letters.some((letter) => degreeIn(f, letter) === 1)) return [f];
  const derivative = letters.map((letter) => derivativeIn(ring, f, letter)).find((candidate) => candidate.length > 0);
  if (derivative === undefined) return isConstant(f) ? [] : split(ring, rootOfPower(ring, f));
  const repeated = gcdMulti(ring, f, derivative);
  if (!isConstant(repeated)) return parted(ring, f, repeated);
  const parts = factorsOf(ring, f);
  return parts.length === 1 ? parts : parts.flatMap((part) => split(ring, part));
}

/** g with g^p = f, for an f of characteristic p whose exponents are all divisible by p: constants of 𝔽_p are their own roots. */
function rootOfPower({ characteristic }: LetterRing, f: MultiPolynomial): MultiPolynomial {
  const p = Number(characteristic);
  return f.map(({ exponents, coefficient }) => ({ exponents: exponents.map((e) => e / p), coefficient }));
}

/** f split along a divisor. */
function parted(ring: LetterRing, f: MultiPolynomial, divisor: MultiPolynomial): readonly MultiPolynomial[] {
  const rest = exactQuotient(ring, f, divisor);
  if (rest === undefined) throw new Error('a divisor does not divide');
  return coprimeBaseMulti(ring, [divisor, rest]).flatMap((part) => split(ring, part));
}
