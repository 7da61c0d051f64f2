import { isConstant, keyOf, type LetterRing, type MultiPolynomial } from './multivariate';
import { exactQuotient } from './multivariate-division';
import { gcdMulti } from './multivariate-gcd';

/**
 * A coprime base of non-zero polynomials: normalized, not constant, pairwise coprime, such that every polynomial of the list is a
 * constant times a product of powers of them. As for integers: D. Bernstein, Factoring into coprimes in essentially linear
 * time, J. Algorithms 54 (2005), section on refinement (from memory); the lists here are short.
 */
export function coprimeBaseMulti(ring: LetterRing, polynomials: Iterable<MultiPolynomial>): readonly MultiPolynomial[] {
  const seen = new Set<string>();
  let base: readonly MultiPolynomial[] = [];
  for (const f of polynomials) {
    const primitive = gcdMulti(ring, f, []);
    const key = keyOf(primitive);
    if (seen.has(key) || isConstant(primitive)) continue;
    seen.add(key);
    base = inserted(ring, base, primitive);
  }
  return base;
}

/** The coprime base of a coprime set and one polynomial more. */
function inserted(ring: LetterRing, base: readonly MultiPolynomial[], f: MultiPolynomial): readonly MultiPolynomial[] {
  const result: MultiPolynomial[] = [];
  let rest = f;
  for (const b of base) {
    const common = isConstant(rest) ? rest : gcdMulti(ring, rest, b);
    if (isConstant(common)) {
      result.push(b);
      continue;
    }
    const left = coprimePart(ring, rest, common);
    const right = coprimePart(ring, b, common);
    result.push(...sharedBase(ring, quotient(ring, rest, left), quotient(ring, b, right)));
    if (!isConstant(right)) result.push(right);
    rest = left;
  }
  if (!isConstant(rest)) result.push(rest);
  return result;
}

/** The largest divisor of f that is coprime to g. */
function coprimePart(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial {
  let rest = f;
  for (let common = gcdMulti(ring, rest, g); !isConstant(common); common = gcdMulti(ring, rest, common))
    rest = quotient(ring, rest, common);
  return gcdMulti(ring, rest, []);
}

/** The coprime base of two polynomials with the same irreducible factors. */
function sharedBase(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): readonly MultiPolynomial[] {
  const [a, b] = [gcdMulti(ring, f, []), gcdMulti(ring, g, [])];
  if (isConstant(a)) return [];
  if (keyOf(a) === keyOf(b)) return [a];
  const common = gcdMulti(ring, a, b);
  return [quotient(ring, a, common), quotient(ring, b, common)]
    .filter((part) => !isConstant(part))
    .reduce<readonly MultiPolynomial[]>((base, part) => inserted(ring, base, gcdMulti(ring, part, [])), [common]);
}

function quotient(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial {
  const found = isConstant(g) ? f : exactQuotient(ring, f, g);
  if (found === undefined) throw new Error('a common factor does not divide');
  return found;
}
