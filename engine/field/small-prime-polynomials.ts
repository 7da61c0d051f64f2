import { smallInverse } from '../arith/modular';
import type { FinitePolynomials } from './finite-polynomials';

/** Primes below this have polynomials of numbers. */
export const SMALL_PRIME_BOUND = 1n << 31n;

/** Above this a factor of a product is taken in two halves, so that many products can be added before they are reduced. */
const HALVED = 2 ** 25;
const HALF = 65536;

/** Sums stay below this; a residue may still be added to one. */
const FULL = 2 ** 53 - 2 ** 33;

/** Multiplications between two calls of `spend`. */
const STRIDE = 100_000;

/** Coefficients 0 … p−1 from the constant term up, the last one not zero. */
type Residues = Float64Array;

/** Polynomials over 𝔽_p for a prime p < 2^31, on exact numbers. */
export const smallPrimePolynomials = (p: number, spend: () => void): FinitePolynomials<Residues> =>
  new SmallPrimePolynomials(p, spend);

class SmallPrimePolynomials implements FinitePolynomials<Residues> {
  readonly order: bigint;
  readonly characteristic: bigint;
  readonly one = Float64Array.of(1);
  readonly x = Float64Array.of(0, 1);
  readonly rowLimit = 1024;
  /** Only to guess quotients; every remainder is put right and exact. */
  private readonly reciprocal: number;
  private readonly halved: boolean;
  /** So many products (of a half and a residue, if halved) can be added up. */
  private readonly run: number;
  private work = 0;

  constructor(
    private readonly p: number,
    private readonly spend: () => void,
  ) {
    this.order = this.characteristic = BigInt(p);
    this.reciprocal = 1 / p;
    this.halved = p > HALVED;
    this.run = Number(BigInt(FULL) / BigInt(this.halved ? HALF * p : p * p));
  }

  degree(f: Residues): number {
    return f.length - 1;
  }

  /** The residue of an integer 0 ≤ a < 2^53 with a/p < 2^31. */
  private reduced(a: number): number {
    const r = a - ((a * this.reciprocal) | 0) * this.p;
    return r < 0 ? r + this.p : r >= this.p ? r - this.p : r;
  }

  private product(a: number, b: number): number {
    if (!this.halved) return this.reduced(a * b);
    const low = a & (HALF - 1);
    return this.reduced(this.reduced((a >>> 16) * b) * HALF + low * b);
  }

  add(f: Residues, g: Residues): Residues {
    const [long, short] = f.length >= g.length ? [f, g] : [g, f];
    const sum = long.slice();
    for (let i = 0; i < short.length; i++) {
      const c = sum[i]! + short[i]!;
      sum[i] = c >= this.p ? c - this.p : c;
    }
    return trimmed(sum);
  }

  subtract(f: Residues, g: Residues): Residues {
    const difference = new Float64Array(f.length >= g.length ? f.length : g.length);
    difference.set(f);
    for (let i = 0; i < g.length; i++) {
      const c = difference[i]! - g[i]!;
      difference[i] = c < 0 ? c + this.p : c;
    }
    return trimmed(difference);
  }

  multiply(f: Residues, g: Residues): Residues {
    return f.length === 0 || g.length === 0 ? new Float64Array(0) : this.low(f, g, f.length + g.length - 1);
  }

  /** The coefficients below x^size of fg; f may have zeros at the top. */
  private low(f: Residues, g: Residues, size: number): Float64Array {
    const sums = new Float64Array(size);
    this.count(f.length * g.length);
    for (let half = this.halved ? 1 : 0; half >= 0; half--) {
      let added = 1; // what the higher half left counts as one
      for (let i = 0; i < f.length && i < size; i++) {
        const c = this.part(f[i]!, half);
        if (c === 0) continue;
        const end = g.length < size - i ? g.length : size - i;
        for (let j = 0; j < end; j++) sums[i + j]! += c * g[j]!;
        if (++added === this.run) {
          this.reduceAll(sums);
          added = 1;
        }
      }
      this.reduceAll(sums);
      if (half === 1) for (let k = 0; k < size; k++) sums[k]! *= HALF;
    }
    return sums;
  }

  combine(f: Residues, rows: readonly Residues[]): Residues {
    let size = 0;
    for (let i = 0; i < f.length; i++) if (rows[i]!.length > size) size = rows[i]!.length;
    const sums = new Float64Array(size);
    this.count(f.length * size);
    for (let half = this.halved ? 1 : 0; half >= 0; half--) {
      let added = 1; // what the higher half left counts as one
      for (let i = 0; i < f.length; i++) {
        const c = this.part(f[i]!, half);
        if (c === 0) continue;
        const row = rows[i]!;
        for (let j = 0; j < row.length; j++) sums[j]! += c * row[j]!;
        if (++added === this.run) {
          this.reduceAll(sums);
          added = 1;
        }
      }
      this.reduceAll(sums);
      if (half === 1) for (let k = 0; k < size; k++) sums[k]! *= HALF;
    }
    return trimmed(sums);
  }

  private part(c: number, half: number): number {
    return !this.halved ? c : half === 1 ? c >>> 16 : c & (HALF - 1);
  }

  private reduceAll(sums: Float64Array): void {
    const { p, reciprocal } = this;
    for (let k = 0; k < sums.length; k++) {
      const a = sums[k]!;
      const r = a - ((a * reciprocal) | 0) * p;
      sums[k] = r < 0 ? r + p : r >= p ? r - p : r;
    }
  }

  monic(f: Residues): Residues {
    const lead = f[f.length - 1]!;
    if (lead === 1) return f;
    const inverse = smallInverse(lead, this.p);
    return f.map((c) => this.product(c, inverse));
  }

  divide(f: Residues, g: Residues): { readonly quotient: Residues; readonly remainder: Residues } {
    const n = g.length - 1;
    if (f.length <= n) return { quotient: new Float64Array(0), remainder: f };
    const rest = f.slice();
    const quotient = new Float64Array(f.length - n);
    const lead = g[n]!;
    const inverse = lead === 1 ? 1 : smallInverse(lead, this.p);
    this.count(n * quotient.length);
    for (let top = f.length - 1; top >= n; top--) {
      const head = rest[top]!;
      if (head === 0) continue;
      const c = inverse === 1 ? head : this.product(head, inverse);
      quotient[top - n] = c;
      this.subtractMultiple(rest, top - n, c, g, n);
    }
    return { quotient, remainder: trimmed(rest.subarray(0, n)) };
  }

  /** rest −= c·x^shift·g on the coefficients below x^n of g. */
  private subtractMultiple(rest: Float64Array, shift: number, c: number, g: Residues, n: number): void {
    const negative = this.p - c;
    if (this.halved) {
      const high = negative >>> 16;
      const low = negative & (HALF - 1);
      for (let j = 0; j < n; j++)
        rest[shift + j] = this.reduced(this.reduced(high * g[j]!) * HALF + low * g[j]! + rest[shift + j]!);
    } else {
      for (let j = 0; j < n; j++) rest[shift + j] = this.reduced(negative * g[j]! + rest[shift + j]!);
    }
  }

  gcd(f: Residues, g: Residues): Residues {
    let [a, b] = f.length >= g.length ? [f, g] : [g, f];
    while (b.length > 1) {
      const rest = this.divide(a, b).remainder;
      a = b;
      b = rest;
    }
    if (b.length === 1) return this.one;
    return a.length === 0 ? a : this.monic(a);
  }

  derivative(f: Residues): Residues {
    const result = new Float64Array(f.length > 0 ? f.length - 1 : 0);
    for (let i = 1; i < f.length; i++) result[i - 1] = this.product(i % this.p, f[i]!);
    return trimmed(result);
  }

  root(f: Residues): Residues {
    return f.filter((_, i) => i % this.p === 0);
  }

  draw(n: number, stream: () => number): Residues {
    return trimmed(Float64Array.from({ length: n }, () => (stream() * 4294967296) % this.p));
  }

  multiplyModulo(m: Residues): (f: Residues, g: Residues) => Residues {
    const n = m.length - 1;
    // the quotient of a polynomial of degree ≤ 2n−2 by m is read off the inverse of the reversed m as a power series
    const reversed = m.slice().reverse();
    const inverse = new Float64Array(n - 1);
    for (let k = 0; k < n - 1; k++) {
      let sum = k === 0 ? 1 : 0;
      for (let i = 1; i <= k; i++) sum += this.p - this.product(reversed[i]!, inverse[k - i]!);
      inverse[k] = sum % this.p;
    }
    const below = m.subarray(0, n);
    return (f, g) => {
      const whole = this.multiply(f, g);
      const length = whole.length - n;
      if (length <= 0) return whole;
      const quotient = this.low(whole.slice(n).reverse(), inverse, length).reverse();
      const multiple = this.low(quotient, below, n);
      for (let k = 0; k < n; k++) {
        const c = whole[k]! - multiple[k]!;
        multiple[k] = c < 0 ? c + this.p : c;
      }
      return trimmed(multiple);
    };
  }

  private count(products: number): void {
    this.work += products;
    if (this.work < STRIDE) return;
    this.work = 0;
    this.spend();
  }
}

function trimmed(f: Float64Array): Residues {
  let n = f.length;
  while (n > 0 && f[n - 1] === 0) n--;
  return n === f.length ? f : f.slice(0, n);
}
