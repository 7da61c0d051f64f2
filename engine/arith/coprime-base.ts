import { gcd } from './gcd';
import { productOf, productTree, remainders } from './product-tree';
import { smallPrimeDivisors } from './small-primes';
import { valuation } from './valuation';

/** Lists up to this length are refined pair by pair: trees do not pay yet. */
const SHORT = 8;

/**
 * A coprime base (gcd-free basis) of non-zero integers: integers > 1, ascending, pairwise coprime, such that every |n| of
 * the list is a product of powers of them. The prime divisors below 2^12 stand in it as themselves; what is left is the
 * natural coprime base of the cofactors, so that the answer depends only on the set of the |n|. Nothing is factored.
 * Throws a RangeError when the list contains 0.
 *
 * D. Bernstein, Factoring into coprimes in essentially linear time, J. Algorithms 54 (2005): merging two coprime sets by
 * product and remainder trees; a shared factor costs some gcds more for each pair it is shared by.
 */
export function coprimeBase(numbers: readonly bigint[]): bigint[] {
  const small = new Set<number>();
  const seen = new Set<bigint>();
  const leftovers = new Set<bigint>();
  for (const n of numbers) {
    if (n === 0n) throw new RangeError('0 has no coprime base');
    let rest = n < 0n ? -n : n;
    if (seen.has(rest)) continue;
    seen.add(rest);
    for (const p of smallPrimeDivisors(rest)) {
      small.add(p);
      rest = valuation(rest, BigInt(p)).unit;
    }
    if (rest > 1n) leftovers.add(rest);
  }
  const base = [...small].map(BigInt).concat(isolatedAndBase([...leftovers]));
  return base.sort((a, b) => (a < b ? -1 : a > b ? 1 : 0));
}

/**
 * As `baseOf`, after those that are coprime to all others have been set aside: n is, iff it is coprime to P/n modulo n, P
 * the product of all; P modulo n² gives all of these at once. D. Bernstein, How to find smooth parts of integers (2004).
 */
function isolatedAndBase(numbers: readonly bigint[]): bigint[] {
  if (numbers.length <= SHORT) return baseOf(numbers);
  const tree = productTree(numbers);
  const residues = remainders(
    tree.at(-1)![0]!,
    tree.map((level) => level.map((n) => n * n)),
  );
  const isolated: bigint[] = [];
  const sharing: bigint[] = [];
  numbers.forEach((n, i) => (gcd(n, residues[i]! / n) === 1n ? isolated : sharing).push(n));
  return isolated.concat(baseOf(sharing));
}

function baseOf(numbers: readonly bigint[]): bigint[] {
  if (numbers.length <= SHORT) return numbers.reduce<bigint[]>(inserted, []);
  const middle = numbers.length >> 1;
  return merge(baseOf(numbers.slice(0, middle)), baseOf(numbers.slice(middle)));
}

/** The coprime base of a coprime set and one number more. */
function inserted(base: readonly bigint[], n: bigint): bigint[] {
  const result: bigint[] = [];
  let rest = n;
  for (const b of base) {
    const { left, shared, right } = refine(rest, b);
    rest = left;
    result.push(...shared);
    if (right > 1n) result.push(right);
  }
  if (rest > 1n) result.push(rest);
  return result;
}

/** The coprime base of two coprime sets. Members that share nothing with the other set are recognised by one remainder. */
function merge(first: readonly bigint[], second: readonly bigint[]): bigint[] {
  const [cleanFirst, sharingFirst] = parted(first, second);
  const [cleanSecond, sharingSecond] = parted(second, sharingFirst);
  const result = [...cleanFirst, ...cleanSecond];
  const tree = productTree(sharingSecond);
  // What each member of the second set has been broken into so far.
  const pieces = sharingSecond.map((b) => [b]);
  for (const a of sharingFirst) {
    let rest = a;
    for (const i of sharers(a, tree, tree.length - 1, 0)) {
      const refined: bigint[] = [];
      for (const piece of pieces[i]!) {
        const { left, shared, right } = refine(rest, piece);
        rest = left;
        refined.push(...shared);
        if (right > 1n) refined.push(right);
      }
      pieces[i] = refined;
    }
    if (rest > 1n) result.push(rest);
  }
  return result.concat(...pieces);
}

/** The members of a list that are coprime to all of `others`, and those that are not. */
function parted(list: readonly bigint[], others: readonly bigint[]): [bigint[], bigint[]] {
  const clean: bigint[] = [];
  const sharing: bigint[] = [];
  if (list.length === 0) return [clean, sharing];
  const residues = remainders(productOf(others), productTree(list));
  list.forEach((n, i) => (gcd(n, residues[i]!) === 1n ? clean : sharing).push(n));
  return [clean, sharing];
}

/** The places in the list of a product tree whose numbers share a factor with a, looked for from the top down. */
function sharers(a: bigint, tree: readonly (readonly bigint[])[], level: number, place: number): number[] {
  const node = tree[level]![place];
  if (node === undefined) return [];
  const shared = gcd(a, node);
  if (shared === 1n) return [];
  if (level === 0) return [place];
  return [...sharers(shared, tree, level - 1, 2 * place), ...sharers(shared, tree, level - 1, 2 * place + 1)];
}

/**
 * For x, y ≥ 1: the part of x coprime to y, the part of y coprime to x, and the coprime base of what is left of both,
 * each member of which divides both.
 */
function refine(x: bigint, y: bigint): { left: bigint; shared: bigint[]; right: bigint } {
  const common = gcd(x, y);
  if (common === 1n) return { left: x, shared: [], right: y };
  const left = coprimePart(x, common);
  const right = coprimePart(y, common);
  return { left, shared: sharedBase(x / left, y / right), right };
}

/** The largest divisor of x that is coprime to y. */
function coprimePart(x: bigint, y: bigint): bigint {
  let rest = x;
  for (let common = gcd(rest, y); common > 1n; common = gcd(rest, common)) rest /= common;
  return rest;
}

/** The coprime base of two numbers with the same prime divisors. */
function sharedBase(x: bigint, y: bigint): bigint[] {
  if (x === 1n) return [];
  if (x === y) return [x];
  const common = gcd(x, y);
  return [x / common, y / common].filter((part) => part > 1n).reduce<bigint[]>(inserted, [common]);
}
