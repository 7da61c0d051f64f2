import { multiplyIntegers, type IntegerPolynomial } from './integer-polynomial';

/** The remainder of f by a monic polynomial over ℤ. */
export function remainderByMonic(f: IntegerPolynomial, monic: IntegerPolynomial): IntegerPolynomial {
  const n = monic.length - 1;
  const rest = f.slice();
  for (let top = rest.length - 1; top >= n; top--) {
    const c = rest[top]!;
    if (c !== 0n) for (let j = 0; j < n; j++) rest[top - n + j]! -= c * monic[j]!;
  }
  if (rest.length > n) rest.length = n;
  while (rest.length > 0 && rest[rest.length - 1] === 0n) rest.pop();
  return rest;
}

export const multiplyModuloMonic = (
  f: IntegerPolynomial,
  g: IntegerPolynomial,
  monic: IntegerPolynomial,
): IntegerPolynomial => remainderByMonic(multiplyIntegers(f, g), monic);

/** Rows f, f·x, f·x², … modulo a monic polynomial of degree n: n rows of length n. */
export function multiplicationRows(f: IntegerPolynomial, monic: IntegerPolynomial): bigint[][] {
  const n = monic.length - 1;
  let row = remainderByMonic(f, monic);
  return Array.from({ length: n }, (_, i) => {
    if (i > 0) row = remainderByMonic([0n, ...row], monic);
    return Array.from({ length: n }, (_unused, j) => row[j] ?? 0n);
  });
}

/**
 * The determinant of a square matrix over ℤ, whose rows are changed. Fraction-free elimination: E. Bareiss, Sylvester's identity and multistep
 * integer-preserving Gaussian elimination, Math. Comp. 22 (1968).
 */
export function determinant(rows: bigint[][], spend: () => void): bigint {
  const n = rows.length;
  let sign = 1n;
  let last = 1n;
  for (let k = 0; k < n; k++) {
    const pivot = rows.findIndex((row, i) => i >= k && row[k] !== 0n);
    if (pivot < 0) return 0n;
    if (pivot !== k) {
      [rows[k], rows[pivot]] = [rows[pivot]!, rows[k]!];
      sign = -sign;
    }
    const top = rows[k]!;
    const lead = top[k]!;
    for (let i = k + 1; i < n; i++) {
      spend();
      const row = rows[i]!;
      const head = row[k]!;
      for (let j = k + 1; j < n; j++) row[j] = (row[j]! * lead - head * top[j]!) / last;
    }
    last = lead;
  }
  return sign * last;
}

/** The norm of f(w) for a root w of a monic polynomial over ℤ: the product of the values of f at the roots. */
export const normOf = (f: IntegerPolynomial, monic: IntegerPolynomial, spend: () => void): bigint =>
  determinant(multiplicationRows(f, monic), spend);

/** The sums of the k-th powers of the roots of a monic polynomial of degree n over ℤ, k = 0 … n − 1, by Newton's identities. */
export function powerSums(monic: IntegerPolynomial): readonly bigint[] {
  const n = monic.length - 1;
  const sums = [BigInt(n)];
  for (let k = 1; k < n; k++) {
    let sum = -BigInt(k) * monic[n - k]!;
    for (let i = 1; i < k; i++) sum -= monic[n - i]! * sums[k - i]!;
    sums.push(sum);
  }
  return sums;
}

/** The characteristic polynomial of f(w), monic over ℤ, from the traces of its powers. */
export function characteristicPolynomial(
  f: IntegerPolynomial,
  monic: IntegerPolynomial,
  spend: () => void,
): IntegerPolynomial {
  const n = monic.length - 1;
  const sums = powerSums(monic);
  const traces: bigint[] = [];
  let power: IntegerPolynomial = [1n];
  for (let k = 1; k <= n; k++) {
    spend();
    power = multiplyModuloMonic(power, f, monic);
    traces.push(power.reduce((sum, c, i) => sum + c * sums[i]!, 0n));
  }
  const result = new Array<bigint>(n + 1).fill(0n);
  result[n] = 1n;
  for (let k = 1; k <= n; k++) {
    let sum = 0n;
    for (let i = 1; i <= k; i++) sum += traces[i - 1]! * result[n - k + i]!;
    result[n - k] = -sum / BigInt(k);
  }
  return result;
}
