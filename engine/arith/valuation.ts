import { EXACT, trailingZeros } from './bits';

/**
 * n = p^exponent · unit with p not dividing unit, for n ≠ 0 and p ≥ 2 (p need not be prime). The unit keeps the sign of n.
 * Throws a RangeError for n = 0, whose valuation is infinite.
 *
 * Divides by p, p², p⁴, … while it goes, then by the same powers downwards: O(log exponent) divisions, so that p^10000 is
 * as quick as one multiplication of that length.
 */
export function valuation(n: bigint, p: bigint): { readonly exponent: number; readonly unit: bigint } {
  if (n === 0n) throw new RangeError('the valuation of 0 is infinite');
  if (p < 2n) throw new RangeError('a valuation needs a prime');
  if (p === 2n) {
    const exponent = trailingZeros(n);
    return { exponent, unit: n >> BigInt(exponent) };
  }
  if (n < EXACT && n > -EXACT) return smallValuation(Number(n), p < EXACT ? Number(p) : 0, n);
  const powers: bigint[] = [];
  let unit = n;
  let exponent = 0;
  for (let power = p; unit % power === 0n; power *= power) {
    unit /= power;
    exponent += 2 ** powers.length;
    powers.push(power);
  }
  for (let i = powers.length - 1; i >= 0; i--) {
    if (unit % powers[i]! !== 0n) continue;
    unit /= powers[i]!;
    exponent += 2 ** i;
  }
  return { exponent, unit };
}

/** As `valuation` for |n| < 2^53; p = 0 stands for a p larger than that. */
function smallValuation(n: number, p: number, whole: bigint): { exponent: number; unit: bigint } {
  let unit = n;
  let exponent = 0;
  while (p !== 0 && unit % p === 0) {
    unit /= p;
    exponent++;
  }
  return { exponent, unit: exponent === 0 ? whole : BigInt(unit) };
}
