import { smallInverse } from '../arith/modular';
import type { FinitePolynomials } from './finite-polynomials';

/** Primes below this have polynomials of numbers. */
export const SMALL_PRIME_BOUND = 1n << 31n;

/** Above this one factor of every product is taken in two halves, so that many products can be added before they are reduced. */
const HALVED = 2 ** 25;
const HALF = 65536;

/** Sums of products stay below this. */
const FULL = 2 ** 53 - 2 ** 33;

/** Multiplications between two calls of `spend`. */
const STRIDE = 100_000;

/** Scratch space for all: nothing stays in it from one operation to the next. */
let sums = new Float64Array(256);
let first = new Float64Array(256);
let second = new Float64Array(256);

/** Coefficients 0 … p−1 from the constant term up, the last one not zero. */
type Residues = readonly number[];

/**
 * Polynomials over 𝔽_p for a prime p < 2^31, on exact numbers: products are below 2^51, or below 2^47 with a half, and are
 * added up to 2^53 in scratch space before they are reduced.
 */
export class SmallPrimePolynomials implements FinitePolynomials<Residues> {
  readonly order: bigint;
  readonly characteristic: bigint;
  readonly one: Residues = [1];
  readonly x: Residues = [0, 1];
  readonly rowLimit = 1024;
  /** Only guesses quotients, to one: every remainder is put right and exact. */
  private readonly reciprocal: number;
  private readonly halved: boolean;
  /** So many products can be added to a residue. */
  private readonly run: number;
  private work = 0;

  constructor(
    private readonly p: number,
    private readonly spend: () => void,
  ) {
    this.order = this.characteristic = BigInt(p);
    this.reciprocal = 1 / p;
    this.halved = p > HALVED;
    this.run = Number(BigInt(FULL) / BigInt(this.halved ? HALF * p : p * p)) - 1;
  }

  degree(f: Residues): number {
    return f.length - 1;
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
    const difference = f.slice();
    for (let i = 0; i < g.length; i++) {
      const c = (i < f.length ? f[i]! : 0) - g[i]!;
      difference[i] = c < 0 ? c + this.p : c;
    }
    return trimmed(difference);
  }

  multiply(f: Residues, g: Residues): Residues {
    if (f.length === 0 || g.length === 0) return [];
    const size = f.length + g.length - 1;
    this.clear(size);
    this.load(g);
    this.convolve(f, first, g.length, size);
    return this.taken(size);
  }

  combine(f: Residues, rows: readonly Residues[]): Residues {
    let size = 0;
    for (let i = 0; i < f.length; i++) if (rows[i]!.length > size) size = rows[i]!.length;
    this.clear(size);
    for (let half = this.halved ? 1 : 0; half >= 0; half--) {
      let added = 0;
      for (let i = 0; i < f.length; i++) {
        const c = this.part(f[i]!, half);
        if (c === 0) continue;
        const row = rows[i]!;
        this.count(row.length);
        for (let j = 0; j < row.length; j++) sums[j]! += c * row[j]!;
        if (++added < this.run) continue;
        this.reduce(size);
        added = 0;
      }
      if (half === 1) this.raise(size);
    }
    return this.taken(size);
  }

  monic(f: Residues): Residues {
    const lead = f[f.length - 1]!;
    if (lead === 1) return f;
    const inverse = smallInverse(lead, this.p);
    return f.map((c) => this.product(c, inverse));
  }

  divide(f: Residues, g: Residues): { readonly quotient: Residues; readonly remainder: Residues } {
    const n = g.length - 1;
    if (f.length <= n) return { quotient: [], remainder: f };
    this.clear(f.length);
    const { p } = this;
    for (let i = 0; i < f.length; i++) sums[i] = f[i]!;
    const below = this.load(g);
    const quotient = new Array<number>(f.length - n);
    const lead = g[n]!;
    const inverse = lead === 1 ? 1 : smallInverse(lead, p);
    for (let top = f.length - 1; top >= n; top--) {
      const head = sums[top]!;
      const c = head === 0 || inverse === 1 ? head : this.product(head, inverse);
      quotient[top - n] = c;
      if (c !== 0) this.addMultiple(sums, top - n, p - c, below, n);
    }
    const remainder: number[] = [];
    for (let i = 0; i < n; i++) remainder.push(sums[i]! | 0);
    return { quotient, remainder: trimmed(remainder) };
  }

  /** target += c·x^shift·g on the coefficients below x^n of g. */
  private addMultiple(target: Float64Array, shift: number, c: number, g: Float64Array, n: number): void {
    this.count(n);
    if (this.halved) {
      const high = c >>> 16;
      const low = c & (HALF - 1);
      for (let j = 0; j < n; j++)
        target[shift + j] = this.reduced(this.reduced(high * g[j]!) * HALF + low * g[j]! + target[shift + j]!);
    } else {
      for (let j = 0; j < n; j++) target[shift + j] = this.reduced(c * g[j]! + target[shift + j]!);
    }
  }

  /** The Euclidean algorithm without divisions: multiples of the remainders, where each is of degree one less, two steps at once. */
  gcd(f: Residues, g: Residues): Residues {
    const [long, short] = f.length >= g.length ? [f, g] : [g, f];
    if (short.length === 0) return long.length === 0 ? long : this.monic(long);
    this.clear(long.length);
    let [a, b] = [this.load(long), this.loadSecond(short)];
    let [m, n] = [long.length - 1, short.length - 1];
    while (n > 0) {
      if (m === n + 1) this.fall(a, b, n);
      else {
        const lead = b[n]!;
        for (let top = m; top >= n; top--) {
          const head = a[top]!;
          if (head === 0) continue;
          if (lead !== 1) for (let i = 0; i < top; i++) a[i] = this.product(a[i]!, lead);
          this.addMultiple(a, top - n, this.p - head, b, n);
        }
      }
      let r = n - 1;
      while (r >= 0 && a[r] === 0) r--;
      [a, b, m, n] = [b, a, n, r];
    }
    if (n === 0) return this.one;
    const common: number[] = [];
    for (let i = 0; i <= m; i++) common.push(a[i]! | 0);
    return this.monic(common);
  }

  /** a ← lc(b)²·a mod b on the coefficients below x^n, for deg a = n + 1 and deg b = n. */
  private fall(a: Float64Array, b: Float64Array, n: number): void {
    this.count(2 * n);
    const { p } = this;
    const lead = b[n]!;
    const scale = this.product(lead, lead);
    const c1 = p - this.product(a[n + 1]!, lead);
    const next = this.product(a[n]!, lead) - this.product(a[n + 1]!, b[n - 1]!);
    const c0 = next > 0 ? p - next : -next;
    if (!this.halved) {
      let before = 0;
      for (let j = 0; j < n; j++) {
        const here = b[j]!;
        a[j] = this.reduced(scale * a[j]! + c1 * before + c0 * here);
        before = here;
      }
      return;
    }
    const [scaleHigh, c1High, c0High] = [scale >>> 16, c1 >>> 16, c0 >>> 16];
    const [scaleLow, c1Low, c0Low] = [scale & (HALF - 1), c1 & (HALF - 1), c0 & (HALF - 1)];
    let before = 0;
    for (let j = 0; j < n; j++) {
      const here = b[j]!;
      const high = this.reduced(scaleHigh * a[j]! + c1High * before + c0High * here);
      a[j] = this.reduced(high * HALF + scaleLow * a[j]! + c1Low * before + c0Low * here);
      before = here;
    }
  }

  derivative(f: Residues): Residues {
    const result: number[] = [];
    for (let i = 1; i < f.length; i++) result.push(this.product(i % this.p, f[i]!));
    return trimmed(result);
  }

  root(f: Residues): Residues {
    return f.filter((_, i) => i % this.p === 0);
  }

  draw(n: number, stream: () => number): Residues {
    return trimmed(Array.from({ length: n }, () => (stream() * 4294967296) % this.p));
  }

  /** The quotient by m is read off the inverse of the reversed m as a power series, made once. */
  multiplyModulo(m: Residues): (f: Residues, g: Residues) => Residues {
    const { p } = this;
    const n = m.length - 1;
    const inverse: number[] = [];
    for (let k = 0; k < n - 1; k++) {
      let sum = k === 0 ? 1 : 0;
      for (let i = 1; i <= k; i++) sum += p - this.product(m[n - i]!, inverse[k - i]!);
      inverse.push(sum % p);
    }
    const negative = m.map((c) => p - c);
    const quotient: number[] = [];
    return (f, g) => {
      const size = f.length + g.length - 1;
      if (size <= n) return this.multiply(f, g);
      this.clear(size);
      this.load(g);
      this.convolve(f, first, g.length, size);
      this.reduce(size);
      for (let i = 0; i < size; i++) first[i] = sums[i]!;
      const above = size - n;
      this.clear(above);
      this.convolveDown(inverse, n, above);
      this.reduce(above);
      for (let i = 0; i < above; i++) quotient[i] = sums[i]! | 0;
      quotient.length = above;
      this.clear(n);
      this.loadSecond(negative);
      this.convolve(quotient, second, n, n);
      for (let i = 0; i < n; i++) sums[i]! += first[i]!;
      return this.taken(n);
    };
  }

  /** sums[i + j] += f[i]·g[j] below `size`, where residues stand. The sums have still to be reduced. */
  private convolve(f: Residues, g: Float64Array, length: number, size: number): void {
    const target = sums;
    for (let half = this.halved ? 1 : 0; half >= 0; half--) {
      let added = 0;
      for (let i = 0; i < f.length && i < size; i++) {
        const c = this.part(f[i]!, half);
        if (c === 0) continue;
        const end = length < size - i ? length : size - i;
        for (let j = 0; j < end; j++) target[i + j]! += c * g[j]!;
        this.count(end);
        if (++added < this.run) continue;
        this.reduce(size);
        added = 0;
      }
      if (half === 1) this.raise(size);
    }
  }

  /** sums[j − i] += f[i]·first[shift + j] from 0 up, for j < length. */
  private convolveDown(f: Residues, shift: number, length: number): void {
    const target = sums;
    const g = first;
    for (let half = this.halved ? 1 : 0; half >= 0; half--) {
      let added = 0;
      for (let i = 0; i < f.length && i < length; i++) {
        const c = this.part(f[i]!, half);
        if (c === 0) continue;
        for (let j = i; j < length; j++) target[j - i]! += c * g[shift + j]!;
        this.count(length - i);
        if (++added < this.run) continue;
        this.reduce(length);
        added = 0;
      }
      if (half === 1) this.raise(length);
    }
  }

  private part(c: number, half: number): number {
    return !this.halved ? c : half === 1 ? c >>> 16 : c & (HALF - 1);
  }

  /** The residue of an integer 0 ≤ a < 2^53 with a/p < 2^31. */
  private reduced(a: number): number {
    const r = a - ((a * this.reciprocal) | 0) * this.p;
    return r < 0 ? r + this.p : r >= this.p ? r - this.p : r;
  }

  private product(a: number, b: number): number {
    if (!this.halved) return this.reduced(a * b) | 0;
    return this.reduced(this.reduced((a >>> 16) * b) * HALF + (a & (HALF - 1)) * b) | 0;
  }

  private reduce(size: number): void {
    const { p, reciprocal } = this;
    for (let k = 0; k < size; k++) {
      const a = sums[k]!;
      const r = a - ((a * reciprocal) | 0) * p;
      sums[k] = r < 0 ? r + p : r >= p ? r - p : r;
    }
  }

  /** The sums of the higher halves take their place above the lower ones. */
  private raise(size: number): void {
    this.reduce(size);
    for (let k = 0; k < size; k++) sums[k]! *= HALF;
  }

  private taken(size: number): Residues {
    this.reduce(size);
    let n = size;
    while (n > 0 && sums[n - 1] === 0) n--;
    const result: number[] = [];
    for (let k = 0; k < n; k++) result.push(sums[k]! | 0);
    return result;
  }

  private clear(size: number): void {
    if (sums.length < size) {
      sums = new Float64Array(2 * size);
      first = new Float64Array(2 * size);
      second = new Float64Array(2 * size);
    } else sums.fill(0, 0, size);
  }

  private load(f: Residues): Float64Array {
    for (let i = 0; i < f.length; i++) first[i] = f[i]!;
    return first;
  }

  private loadSecond(f: Residues): Float64Array {
    for (let i = 0; i < f.length; i++) second[i] = f[i]!;
    return second;
  }

  private count(products: number): void {
    this.work += products;
    if (this.work < STRIDE) return;
    this.work = 0;
    this.spend();
  }
}

function trimmed(f: number[]): Residues {
  while (f.length > 0 && f[f.length - 1] === 0) f.pop();
  return f;
}
