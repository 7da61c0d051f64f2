import { modulo } from '../arith/modular';
import { rootExponent } from './factor-bounds';
import { exactQuotient, primitivePart, type IntegerPolynomial } from './integer-polynomial';

/** 2^48: second coefficients are compared to this precision, and sums of them stay exact. */
const SCALE_BITS = 48n;
const SCALE = 2 ** 48;

interface Lifted {
  readonly factor: IntegerPolynomial;
  readonly degree: number;
  /** ⌊c·2^48/m⌋ for the second coefficient c of lc(f)·factor modulo m. */
  second: number;
}

/**
 * The irreducible factors over ℤ of a primitive square-free f, from its monic factors modulo m = p^k. `m` is more than twice the
 * bound of `divisorBound` for half of the degree; bit d of `degrees` says whether a divisor may have degree d.
 *
 * Products of few modular factors are tried first. Tested before anything is multiplied: the degree; the second coefficient, for the sum of
 * the roots of a divisor is bounded; the constant term. H. Zassenhaus (1969); J. Abbott, V. Shoup, P. Zimmermann, Factorization in ℤ[x]: the
 * searching phase, ISSAC 2000.
 */
export function recombine(
  f: IntegerPolynomial,
  lifted: readonly IntegerPolynomial[],
  m: bigint,
  degrees: bigint,
  spend: () => void,
): readonly IntegerPolynomial[] {
  const found: IntegerPolynomial[] = [];
  let rest = f;
  let left: Lifted[] = lifted.map((factor) => ({ factor, degree: factor.length - 1, second: 0 }));
  measure(rest, left, m);
  for (let size = 1; 2 * size <= left.length;) {
    const hit = divisorOf(rest, left, size, m, degrees, spend);
    if (hit === undefined) {
      size++;
      continue;
    }
    found.push(hit.divisor);
    rest = hit.quotient;
    left = left.filter((one) => !hit.chosen.includes(one));
    measure(rest, left, m);
  }
  return rest.length > 1 ? [...found, rest] : found;
}

function measure(f: IntegerPolynomial, left: readonly Lifted[], m: bigint): void {
  const lead = f[f.length - 1]!;
  for (const one of left) {
    one.second = Number((modulo(lead * one.factor[one.degree - 1]!, m) << SCALE_BITS) / m);
  }
}

interface Hit {
  readonly chosen: readonly Lifted[];
  readonly divisor: IntegerPolynomial;
  readonly quotient: IntegerPolynomial;
}

/** A divisor of f made of `size` modular factors. */
function divisorOf(
  f: IntegerPolynomial,
  left: readonly Lifted[],
  size: number,
  m: bigint,
  degrees: bigint,
  spend: () => void,
): Hit | undefined {
  const n = f.length - 1;
  // the sum of the roots of a divisor of degree d is at most d·2^e in size
  const e = rootExponent(f);
  const lead = f[n]! << SCALE_BITS;
  const slack = (d: number): number => {
    const bound = (e >= 0 ? (lead * BigInt(d)) << BigInt(e) : (lead * BigInt(d)) >> BigInt(-e)) / m;
    return bound >= BigInt(SCALE / 2) ? SCALE / 2 : Number(bound) + 2 + size;
  };
  const slacks = Array.from({ length: n + 1 }, (_, d) => slack(d));
  const chosen: Lifted[] = [];
  let steps = 0;
  const search = (from: number, degree: number, second: number): Hit | undefined => {
    if (chosen.length === size) {
      if ((++steps & 255) === 0) spend();
      if (((degrees >> BigInt(degree)) & 1n) === 0n) return undefined;
      const near = second % SCALE;
      const bound = slacks[degree]!;
      if (near > bound && SCALE - near > bound) return undefined;
      return divisorFrom(f, left, chosen, degree, m, spend);
    }
    // every divisor or its cofactor is met when exactly half of the factors are taken: the first may be fixed then
    const last = 2 * size === left.length && chosen.length === 0 ? 0 : left.length - (size - chosen.length);
    for (let i = from; i <= last; i++) {
      const next = left[i]!;
      chosen.push(next);
      const hit = search(i + 1, degree + next.degree, second + next.second);
      if (hit !== undefined) return hit;
      chosen.pop();
    }
    return undefined;
  };
  return search(0, 0, 0);
}

function divisorFrom(
  f: IntegerPolynomial,
  left: readonly Lifted[],
  chosen: readonly Lifted[],
  degree: number,
  m: bigint,
  spend: () => void,
): Hit | undefined {
  spend();
  const n = f.length - 1;
  // m is large enough for divisors of half the degree: of the product and its cofactor one has that
  const few = 2 * degree <= n;
  const used = few ? chosen : left.filter((one) => !chosen.includes(one));
  const constant = centred(
    used.reduce((value, { factor }) => (value * factor[0]!) % m, f[n]!),
    m,
  );
  if (constant === 0n ? f[0] !== 0n : (f[n]! * f[0]!) % constant !== 0n) return undefined;
  let product: IntegerPolynomial = [f[n]!];
  for (const { factor } of used) {
    spend();
    product = multiplyModulo(product, factor, m);
  }
  const divisor = primitivePart(product.map((c) => centred(c, m)));
  const quotient = exactQuotient(f, divisor, spend);
  if (quotient === undefined) return undefined;
  const [mine, other] = few ? [divisor, quotient] : [quotient, divisor];
  return { chosen: [...chosen], divisor: mine, quotient: primitivePart(other) };
}

function multiplyModulo(f: IntegerPolynomial, g: IntegerPolynomial, m: bigint): IntegerPolynomial {
  const product = new Array<bigint>(f.length + g.length - 1).fill(0n);
  for (let i = 0; i < f.length; i++) for (let j = 0; j < g.length; j++) product[i + j]! += f[i]! * g[j]!;
  return product.map((c) => c % m);
}

function centred(c: bigint, m: bigint): bigint {
  const r = modulo(c, m);
  return 2n * r > m ? r - m : r;
}
