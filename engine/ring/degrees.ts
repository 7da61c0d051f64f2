import { checkDegree } from './limits';
import type { Term } from './term';

/** A non-empty finite set of degrees: bit i of `bits` stands for the degree low + i, and bit 0 is set. */
interface DegreeSet {
  readonly low: number;
  readonly bits: bigint;
}

/** The degrees of the words a sum of terms multiplies out to, highest first. */
export function degreesOf<A>(terms: readonly Term<A>[]): readonly number[] {
  const [first] = terms;
  if (first === undefined) return [];
  const degree = first.factors.length - first.eta;
  if (terms.every((term) => term.factors.length - term.eta === degree && term.factors.every(isSymbol))) return [degree];
  const degrees = new Set<number>();
  const sums: Term<A>[] = [];
  for (const term of terms) {
    if (term.factors.every(isSymbol)) degrees.add(term.factors.length - term.eta);
    else sums.push(term);
  }
  for (const term of sums) for (const degree of degreesOfSum(term)) degrees.add(degree);
  return [...degrees].sort((a, b) => b - a);
}

const isSymbol = (factor: { readonly kind: string }): boolean => factor.kind === 'symbol';

/** Terms are asked once for every place they ramify at. */
const known = new WeakMap<object, readonly number[]>();

function degreesOfSum<A>(term: Term<A>): readonly number[] {
  let degrees = known.get(term);
  if (degrees === undefined) {
    const set = degreeSet([term]);
    degrees = set === undefined ? [] : bitsOf(set.bits).map((i) => set.low + i);
    known.set(term, degrees);
  }
  return degrees;
}

function degreeSet<A>(terms: readonly Term<A>[]): DegreeSet | undefined {
  const plain = new Set<number>();
  let union: DegreeSet | undefined;
  for (const term of terms) {
    let degree = -term.eta;
    let compound: DegreeSet | undefined = { low: 0, bits: 1n };
    for (const factor of term.factors) {
      if (factor.kind === 'symbol') degree += 1;
      else compound = compound && sums(compound, multiples(degreeSet(factor.of), factor.exponent));
    }
    if (compound === undefined) continue;
    if (compound.bits === 1n) plain.add(degree + compound.low);
    else union = unite(union, { low: compound.low + degree, bits: compound.bits });
  }
  for (const low of plain) union = unite(union, { low, bits: 1n });
  return union;
}

function unite(x: DegreeSet | undefined, y: DegreeSet): DegreeSet {
  if (x === undefined) return y;
  const low = Math.min(x.low, y.low);
  return { low, bits: (x.bits << BigInt(x.low - low)) | (y.bits << BigInt(y.low - low)) };
}

function sums(x: DegreeSet, y: DegreeSet | undefined): DegreeSet | undefined {
  if (y === undefined) return undefined;
  let bits = 0n;
  for (const i of bitsOf(y.bits)) bits |= x.bits << BigInt(i);
  const low = x.low + y.low;
  checkDegree(low);
  checkDegree(low + bits.toString(2).length - 1);
  return { low, bits };
}

function multiples(x: DegreeSet | undefined, times: number): DegreeSet | undefined {
  let result: DegreeSet | undefined = { low: 0, bits: 1n };
  let square = x;
  for (let rest = times; rest > 0; rest >>= 1) {
    if (rest & 1) result = result && sums(result, square);
    if (rest > 1) square = square && sums(square, square);
  }
  return result;
}

function bitsOf(bits: bigint): readonly number[] {
  const positions: number[] = [];
  const digits = bits.toString(2);
  for (let i = 0; i < digits.length; i += 1) if (digits[digits.length - 1 - i] === '1') positions.push(i);
  return positions;
}
