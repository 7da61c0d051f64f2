import { coprimeBase } from '../arith/coprime-base';
import { isOddInt } from '../arith/int';
import { valuation } from '../arith/valuation';
import { forEachExponent, type RationalEntry } from './rational-entry';
import type { BaseElement } from './sight';

/**
 * Whether a formal square class modulo a composite b is seen to be a square modulo every prime that divides b, without splitting
 * b: bit 0 of `mask` stands for −1, bit i + 1 for the i-th element of the base.
 *
 * Every number v in sight that is prime to b gives two classes that are the same modulo b: that of v over the base, and that of
 * its least residue ±r over a coprime base of all these residues. The mask is a square if a product of such pairs has it on
 * the first side and 1 on the second: linear algebra over 𝔽_2. So N and N + M agree modulo a factor of M whatever they
 * are made of.
 */
export function isKnownSquare(
  base: readonly BaseElement[],
  entries: readonly RationalEntry[],
  b: bigint,
  mask: bigint,
): boolean {
  const numbers = new Map<bigint, bigint>();
  base.forEach(({ value }, i) => {
    if (value !== b) numbers.set(value, 1n << BigInt(i + 1));
  });
  for (const entry of entries) {
    const { value } = entry;
    for (const [n, above] of [[value.num < 0n ? -value.num : value.num, true] as const, [value.den, false] as const]) {
      if (n === 1n || n % b === 0n || numbers.has(n)) continue;
      let own = 0n;
      forEachExponent(entry, (i, e) => {
        if (isOddInt(e) && e > 0 === above) own |= 1n << BigInt(i + 1);
      });
      numbers.set(n, own);
    }
  }
  const residues = [...numbers].map(([n, own]) => {
    const least = n % b;
    return 2n * least > b ? { own, negative: true, size: b - least } : { own, negative: false, size: least };
  });
  const factors = coprimeBase(residues.map(({ size }) => size));
  const shift = BigInt(base.length + 1);
  const pairs = residues.map(({ own, negative, size }) => {
    let residue = negative ? 1n : 0n;
    factors.forEach((f, i) => {
      if (valuation(size, f).exponent % 2 === 1) residue |= 1n << BigInt(i + 1);
    });
    return own | (residue << shift);
  });
  return inSpan(mask, [1n | (1n << shift), ...pairs]);
}

/** Whether a vector over 𝔽_2 is a sum of some of the others: Gaussian elimination by leading bits. */
function inSpan(target: bigint, vectors: readonly bigint[]): boolean {
  const pivots: { readonly vector: bigint; readonly lead: bigint }[] = [];
  const reduce = (vector: bigint): bigint =>
    pivots.reduce((rest, pivot) => ((rest & pivot.lead) === 0n ? rest : rest ^ pivot.vector), vector);
  for (const vector of vectors) {
    const rest = reduce(vector);
    if (rest !== 0n) pivots.push({ vector: rest, lead: 1n << BigInt(rest.toString(2).length - 1) });
  }
  return reduce(target) === 0n;
}
