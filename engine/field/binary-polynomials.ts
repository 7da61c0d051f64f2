import type { FinitePolynomials } from './finite-polynomials';

/** Coefficients as bits, 32 a word from the constant term up, the last word not zero. */
type Bits = Uint32Array<ArrayBuffer>;

/** Words combined between two calls of `spend`. */
const STRIDE = 100_000;

/** The bits of a byte with a zero behind each: squaring over 𝔽_2. */
const spread = Uint16Array.from({ length: 256 }, (_, byte) => {
  let wide = 0;
  for (let i = 0; i < 8; i++) wide |= ((byte >> i) & 1) << (2 * i);
  return wide;
});

/** Polynomials over 𝔽_2, 32 coefficients a word. */
export function binaryPolynomials(spend: () => void): FinitePolynomials<Bits> {
  let work = 0;
  const count = (words: number): void => {
    work += words;
    if (work < STRIDE) return;
    work = 0;
    spend();
  };

  /** target += x^shift·g */
  const addShifted = (target: Bits, g: Bits, shift: number): void => {
    const words = shift >>> 5;
    const bits = shift & 31;
    count(g.length);
    if (bits === 0) {
      for (let i = 0; i < g.length; i++) target[words + i]! ^= g[i]!;
      return;
    }
    let carry = 0;
    for (let i = 0; i < g.length; i++) {
      const word = g[i]!;
      target[words + i]! ^= (word << bits) | carry;
      carry = word >>> (32 - bits);
    }
    if (carry !== 0) target[words + g.length]! ^= carry;
  };

  const add = (f: Bits, g: Bits): Bits => {
    const [long, short] = f.length >= g.length ? [f, g] : [g, f];
    const sum = long.slice();
    for (let i = 0; i < short.length; i++) sum[i]! ^= short[i]!;
    return trimmed(sum);
  };

  const square = (f: Bits): Bits => {
    const result = new Uint32Array(2 * f.length);
    for (let i = 0; i < f.length; i++) {
      const word = f[i]!;
      result[2 * i] = spread[word & 255]! | (spread[(word >>> 8) & 255]! << 16);
      result[2 * i + 1] = spread[(word >>> 16) & 255]! | (spread[word >>> 24]! << 16);
    }
    return trimmed(result);
  };

  const multiply = (f: Bits, g: Bits): Bits => {
    if (f === g) return square(f);
    const product = new Uint32Array(f.length + g.length);
    for (let i = 0; i < f.length; i++) {
      for (let word = f[i]!; word !== 0; word &= word - 1)
        addShifted(product, g, 32 * i + 31 - Math.clz32(word & -word));
    }
    return trimmed(product);
  };

  /** Leaves the remainder in `rest`; the quotient is added to `quotient`, if there is one. */
  const reduce = (rest: Bits, g: Bits, quotient?: Bits): void => {
    const n = degree(g);
    for (let i = rest.length - 1; i >= n >>> 5; i--) {
      for (;;) {
        const word = rest[i]!;
        const shift = 32 * i + 31 - Math.clz32(word) - n;
        if (word === 0 || shift < 0) break;
        addShifted(rest, g, shift);
        if (quotient !== undefined) quotient[shift >>> 5]! |= 1 << (shift & 31);
      }
    }
  };

  return {
    order: 2n,
    characteristic: 2n,
    one: Uint32Array.of(1),
    x: Uint32Array.of(2),
    degree,
    add,
    subtract: add,
    multiply,
    monic: (f) => f,
    divide(f, g) {
      if (f.length < g.length) return { quotient: new Uint32Array(0), remainder: f };
      const rest = f.slice();
      const quotient = new Uint32Array(f.length - g.length + 1);
      reduce(rest, g, quotient);
      return { quotient: trimmed(quotient), remainder: trimmed(rest) };
    },
    gcd(f, g) {
      let [a, b] = f.length >= g.length ? [f.slice(), g.slice()] : [g.slice(), f.slice()];
      while (b.length > 0) {
        reduce(a, b);
        [a, b] = [b, trimmed(a)];
      }
      return a;
    },
    derivative: (f) => trimmed(f.map((word, i) => ((word >>> 1) | ((f[i + 1] ?? 0) << 31)) & 0x55555555)),
    root(f) {
      const result = new Uint32Array((f.length + 1) >>> 1);
      for (let i = 0; i < 16 * f.length; i++) {
        if ((f[i >>> 4]! >>> ((2 * i) & 31)) & 1) result[i >>> 5]! |= 1 << (i & 31);
      }
      return trimmed(result);
    },
    draw(n, stream) {
      const bits = Uint32Array.from({ length: (n + 31) >>> 5 }, () => stream() * 4294967296);
      if ((n & 31) !== 0) bits[bits.length - 1]! &= (1 << (n & 31)) - 1;
      return trimmed(bits);
    },
    multiplyModulo: (m) => (f, g) => {
      const product = multiply(f, g).slice();
      reduce(product, m);
      return trimmed(product);
    },
    combine(f, rows) {
      let sum: Bits = new Uint32Array(0);
      for (let i = 0; i <= degree(f); i++) if ((f[i >>> 5]! >>> (i & 31)) & 1) sum = add(sum, rows[i]!);
      return sum;
    },
    // Frobenius is squaring, quicker than any table
    rowLimit: 0,
  };
}

function degree(f: Bits): number {
  return f.length === 0 ? -1 : 32 * f.length - 1 - Math.clz32(f[f.length - 1]!);
}

function trimmed(f: Bits): Bits {
  let n = f.length;
  while (n > 0 && f[n - 1] === 0) n--;
  return n === f.length ? f : f.slice(0, n);
}
