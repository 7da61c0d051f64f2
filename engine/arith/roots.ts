import { EXACT, bitLength } from './bits';

/**
 * The largest integer r ≥ 0 with r^k ≤ n, for n ≥ 0 and k ≥ 1.
 * Newton's iteration from above in integers: Cohen, Algorithm 1.7.1 for k = 2 (number from memory), the same for any k.
 */
export function integerRoot(n: bigint, k: number): bigint {
  if (n < 0n) throw new RangeError('an integer root needs a number that is not negative');
  if (k === 1 || n < 2n) return n;
  const bits = bitLength(n);
  if (bits <= k) return 1n;
  const exponent = BigInt(k);
  // 2^⌈bits/k⌉ is above the root, and from above the iteration decreases until it has arrived.
  let root = 1n << BigInt((bits - (bits % k)) / k + (bits % k === 0 ? 0 : 1));
  if (bits > 8 * k && bits > 128) {
    // Start with the root of the leading half, rounded up, so that few long steps remain.
    const kept = ((bits - (bits % (2 * k))) / (2 * k)) * k;
    root = (integerRoot(n >> BigInt(kept), k) + 1n) << BigInt(kept / k);
  }
  for (;;) {
    const next = ((exponent - 1n) * root + n / root ** (exponent - 1n)) / exponent;
    if (next >= root) return root;
    root = next;
  }
}

const squareModulo64 = new Set<number>();
for (let i = 0; i < 64; i++) squareModulo64.add((i * i) % 64);

/** The root of a perfect square n ≥ 0; `undefined` when n is none. */
export function exactSquareRoot(n: bigint): bigint | undefined {
  if (!squareModulo64.has(Number(BigInt.asUintN(6, n)))) return undefined;
  if (n >= EXACT && !squareResidues(n)) return undefined;
  const root = integerRoot(n, 2);
  return root * root === n ? root : undefined;
}

/** Whether n is a square modulo 63, 65 and 11 (Cohen, Algorithm 1.7.3, number from memory): false settles it. */
function squareResidues(n: bigint): boolean {
  const r = Number(n % 45045n);
  return squares63[r % 63] === 1 && squares65[r % 65] === 1 && squares11[r % 11] === 1;
}

const squares = (m: number): Uint8Array => {
  const table = new Uint8Array(m);
  for (let i = 0; i < m; i++) table[(i * i) % m] = 1;
  return table;
};
const squares63 = squares(63);
const squares65 = squares(65);
const squares11 = squares(11);
