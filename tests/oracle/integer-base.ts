import type { Element } from '@/engine/expression/element';
import type { Monomial } from './canonical-words';
import { valueOf } from './fraction';

function gcd(a: bigint, b: bigint): bigint {
  while (b !== 0n) [a, b] = [b, a % b];
  return a;
}

const size = (n: bigint): bigint => (n < 0n ? -n : n);

/** The integer whose power n > 1 is, with the largest exponent for which there is one: by halving. */
function root(n: bigint): bigint {
  for (const k of [2n, 3n, 5n, 7n]) {
    let [low, high] = [1n, n];
    while (low < high) {
      const middle = (low + high + 1n) / 2n;
      if (middle ** k <= n) low = middle;
      else high = middle - 1n;
    }
    if (low > 1n && low ** k === n) return root(low);
  }
  return n;
}

/** Pairwise coprime integers > 1 of which all the given ones, none of them zero, are ± products of powers: by gcds, one by one. */
function coprimeIntegers(numbers: Iterable<bigint>): readonly bigint[] {
  const base: bigint[] = [];
  const waiting = [...numbers].map(size);
  for (let n = waiting.pop(); n !== undefined; n = waiting.pop()) {
    if (n === 1n) continue;
    const at = base.findIndex((b) => gcd(b, n) > 1n);
    const b = base[at];
    if (b === undefined) base.push(n);
    else if (b !== n) {
      const common = gcd(b, n);
      base.splice(at, 1);
      waiting.push(common, b / common, n / common);
    }
  }
  return base.map(root).sort((a, b) => (a < b ? -1 : 1));
}

/** Rational entries, none of them zero, as ± products of powers of coprime integers; of these nothing else is used. */
export function overCoprimeIntegers(entries: readonly Element[]): (entry: Element) => Monomial {
  const values = entries.map(valueOf);
  if (values.some(({ num }) => num === 0n)) throw new RangeError('an entry is zero');
  const base = coprimeIntegers(values.flatMap(({ num, den }) => [num, den]));
  const exponent = (n: bigint, b: bigint): number => {
    let e = 0;
    for (let rest = size(n); rest % b === 0n; rest /= b) e += 1;
    return e;
  };
  return (entry) => {
    const { num, den } = valueOf(entry);
    const exponents = new Map<string, number>();
    for (const b of base) {
      const e = exponent(num, b) - exponent(den, b);
      if (e !== 0) exponents.set(b.toString(), e);
    }
    return { negative: num < 0n, exponents };
  };
}
