import type { Budget } from '../arith/budget';
import { CoprimePieces } from './coprime-pieces';
import { comparePolynomials, factored } from './factor-finite';
import type { FiniteField } from './field';
import { withFinitePolynomials, type FinitePolynomials, type Shape } from './finite-polynomials';
import type { Polynomial } from './polynomial';
import { squareFreeParts } from './square-free';

/** The place of a polynomial in a base and the exponent it stands with. */
export interface PlacedExponent {
  readonly index: number;
  readonly exponent: number;
}

/** A coprime base, and every polynomial of a list, up to a constant, as a product of powers of it, ascending by place. */
export interface CoprimeBase<P> {
  readonly base: readonly P[];
  readonly exponents: readonly (readonly PlacedExponent[])[];
}

/** Polynomials up to this degree are factored, which is quicker than comparing them with each other. */
const SHORT = 64;

/**
 * A coprime base of polynomials ≠ 0 over 𝔽_q: monic square-free polynomials of degree ≥ 1, pairwise coprime, in the order of
 * `comparePolynomials`. What has degree at most 64 is factored; of longer ones only greatest common divisors are taken, so that
 * members of the base may be reducible. Throws a RangeError when the list contains 0.
 */
export function coprimeOverFinite<E>(
  field: FiniteField<E>,
  list: readonly Polynomial<E>[],
  budget: Budget,
  doing = `comparing polynomials over ${field.name}`,
): CoprimeBase<Polynomial<E>> {
  if (list.some((f) => f.length === 0)) throw new RangeError('0 has no coprime base');
  const spend = (): void => budget.spend(doing);
  return withFinitePolynomials(field, spend, (shape) => baseOf(field, shape, list, spend));
}

function baseOf<E, P>(
  field: FiniteField<E>,
  { ring, read, write }: Shape<E, P>,
  list: readonly Polynomial<E>[],
  spend: () => void,
): CoprimeBase<Polynomial<E>> {
  const members = new Map<string, { readonly value: P; readonly written: Polynomial<E> }>();
  const named = (value: P): string => {
    const written = write(value);
    const name = written.map((c) => field.index(c)).join(' ');
    if (!members.has(name)) members.set(name, { value, written });
    return name;
  };
  const made: (readonly (readonly [string, number])[])[] = list.map((f) => {
    spend();
    if (f.length > SHORT + 1) return [];
    return factored(ring, ring.monic(read(f)), spend).map(({ factor, exponent }) => [named(factor), exponent]);
  });
  const short = [...members].map(([name, { value }]) => [name, value] as const);
  const pieces = longPieces(ring, spend);
  const long = list.map((f) => {
    if (f.length <= SHORT + 1) return [];
    return squareFreeParts(ring, ring.monic(read(f))).map(({ factor, exponent }) => {
      const { among, rest } = stripped(ring, factor, short, spend);
      pieces.insert(rest, [0]);
      return { among, rest, exponent };
    });
  });
  const longNames = pieces.values().map((value) => [named(value), value] as const);
  const sorted = [...members].sort(([, a], [, b]) => comparePolynomials(field, a.written, b.written));
  const places = new Map(sorted.map(([name], i) => [name, i]));
  const exponents = list.map((_, i) => {
    const found = long[i]!.flatMap(({ among, rest, exponent }) => {
      const ownPieces = longNames.filter(([, value]) => divides(ring, value, rest)).map(([name]) => name);
      return [...among, ...ownPieces].map((name) => [name, exponent] as const);
    });
    const all = [...made[i]!, ...found].map(([name, exponent]) => ({ index: places.get(name)!, exponent }));
    return all.sort((a, b) => a.index - b.index);
  });
  return { base: sorted.map(([, { written }]) => written), exponents };
}

const divides = <P>(ring: FinitePolynomials<P>, g: P, f: P): boolean =>
  ring.degree(g) <= ring.degree(f) && ring.degree(ring.divide(f, g).remainder) < 0;

/** Polynomials too long to be factored are all compared with each other: they have one key for all. */
const longPieces = <P>(ring: FinitePolynomials<P>, spend: () => void): CoprimePieces<P> =>
  new CoprimePieces(
    {
      degree: (f) => ring.degree(f),
      gcd: (f, g) => ring.gcd(f, g),
      quotient: (f, g) => ring.divide(f, g).quotient,
      keysOf: (_, keys) => keys,
    },
    spend,
  );

/** Takes the irreducible polynomials of a list out of a square-free f; their names, and what is left. */
function stripped<P>(
  ring: FinitePolynomials<P>,
  f: P,
  list: readonly (readonly [string, P])[],
  spend: () => void,
): { readonly among: readonly string[]; readonly rest: P } {
  const multiply = ring.multiplyModulo(f);
  const product = list.reduce((value, [, g]) => {
    spend();
    return multiply(value, ring.divide(g, f).remainder);
  }, ring.one);
  const common = ring.gcd(product, f);
  if (ring.degree(common) < 1) return { among: [], rest: f };
  const among = list.filter(([, g]) => divides(ring, g, common)).map(([name]) => name);
  return { among, rest: ring.divide(f, common).quotient };
}
