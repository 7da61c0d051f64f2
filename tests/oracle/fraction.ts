import type { Element } from '@/engine/expression/element';

/** A rational number in lowest terms with positive denominator. */
export interface Fraction {
  readonly num: bigint;
  readonly den: bigint;
}

export function fraction(num: bigint, den = 1n): Fraction {
  if (den === 0n) throw new RangeError('division by zero');
  let [a, b] = [num < 0n ? -num : num, den < 0n ? -den : den];
  while (b !== 0n) [a, b] = [b, a % b];
  const sign = den < 0n ? -1n : 1n;
  return { num: (sign * num) / a, den: (sign * den) / a };
}

export const times = (a: Fraction, b: Fraction): Fraction => fraction(a.num * b.num, a.den * b.den);

/** a^n for any integer n; a ≠ 0 when n < 0. */
export const raised = ({ num, den }: Fraction, n: bigint): Fraction =>
  n < 0n ? fraction(den ** -n, num ** -n) : fraction(num ** n, den ** n);

/** The value of an element written without letters. Throws a RangeError for a division by zero. */
export function valueOf(element: Element): Fraction {
  switch (element.kind) {
    case 'integer':
      return fraction(element.value);
    case 'letter':
      throw new RangeError(`no letter ${element.name} in the rational numbers`);
    case 'negate':
      return times(fraction(-1n), valueOf(element.of));
    case 'sum':
      return element.terms
        .map(valueOf)
        .reduce((a, b) => fraction(a.num * b.den + b.num * a.den, a.den * b.den), fraction(0n));
    case 'product':
      return element.factors.map(valueOf).reduce(times, fraction(1n));
    case 'quotient':
      return times(valueOf(element.numerator), raised(valueOf(element.denominator), -1n));
    case 'power':
      return raised(valueOf(element.base), BigInt(element.exponent));
  }
}

const known = new Map<bigint, readonly bigint[]>();
const large: bigint[] = [];

/** Primes past what trial division reaches, that a test builds its entries from. */
export function declarePrimes(primes: readonly bigint[]): void {
  large.push(...primes);
}

/** The primes that divide n ≠ 0: those declared, then by trial division. */
export function primesOf(n: bigint): readonly bigint[] {
  let rest = n < 0n ? -n : n;
  const found = known.get(rest);
  if (found !== undefined) return found;
  const size = rest;
  const primes = large.filter((p) => rest % p === 0n);
  for (const p of primes) while (rest % p === 0n) rest /= p;
  for (let p = 2n; p * p <= rest; p += 1n) {
    if (rest % p !== 0n) continue;
    primes.push(p);
    while (rest % p === 0n) rest /= p;
  }
  if (rest > 1n) primes.push(rest);
  known.set(size, primes);
  return primes;
}

/** The exponent of p in n ≠ 0. */
export function exponentIn(n: bigint, p: bigint): number {
  let exponent = 0;
  for (let rest = n; rest % p === 0n; rest /= p) exponent += 1;
  return exponent;
}

/** The square-free integer in the square class of a rational number. */
export function squareFree({ num, den }: Fraction): bigint {
  const odd = (n: bigint): bigint =>
    primesOf(n).reduce((product, p) => (exponentIn(n, p) % 2 === 1 ? product * p : product), 1n);
  return (num < 0n ? -1n : 1n) * odd(num) * odd(den); // num and den have no prime in common
}

/** a^e modulo p for e ≥ 0. */
export function powerMod(a: bigint, e: bigint, p: bigint): bigint {
  let [result, base] = [1n % p, ((a % p) + p) % p];
  for (let rest = e; rest > 0n; rest /= 2n) {
    if (rest % 2n === 1n) result = (result * base) % p;
    base = (base * base) % p;
  }
  return result;
}
