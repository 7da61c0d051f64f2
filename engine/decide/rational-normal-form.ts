import type { Budget } from '../arith/budget';
import { factor } from '../arith/factor';
import { toInt, type Int } from '../arith/int';
import { integerElement } from '../expression/element';
import { symbol, type Expression } from '../expression/expression';
import { primeResidueField } from '../place/prime-residue-field';
import { forEachExponent, rationalEntry, type RationalEntry } from '../place/rational-entry';
import { rationalPlace } from '../place/rational-place';
import type { BaseElement } from '../place/sight';
import { thetaRing, type Visited } from '../place/theta-ring';
import { accumulate, evaluate } from '../ring/evaluate';
import { orderModFour } from '../ring/field-units';
import { residueRing } from '../ring/residue-ring';
import { residueWords } from '../ring/residue-words';
import { rankRing, signatureRing } from '../ring/signature-ring';
import type { Term } from '../ring/term';
import { writeResidueClass } from '../ring/write-residue-class';
import { etaFactors, minusOneElement, multiple, symbolFactors, total } from '../ring/write-word';
import type { NormalizedDegree } from './outcome';
import type { RationalClasses } from './rational-classes';
import { incidence } from './rational-statement';
import { WrittenDegrees } from './written-degrees';

/**
 * The tower normal form over ℚ: α = b + Σ_p [p]·r̃_p, unique, so that two classes are equal iff their forms are identical.
 *
 * For p from the largest prime downwards let r_p be the residue at p of what is left and r̃_p its canonical lift, written with
 * integers in 1 … p − 1; subtract [p]·r̃_p. All primes of r̃_p are smaller than p, so this ends, and what is left lies in the
 * constants B_n, seen by signature and rank: c[−1]ⁿ for n ≥ 1 with signature (−2)ⁿc, x + yη[−1] for n = 0, cη⁻ⁿ for n < 0
 * (the filtration of J. Milnor, Introduction to Algebraic K-Theory, §11, after Tate, lifted along the pull-back theorem).
 */
export function rationalNormalForm<A, B extends Visited>(
  classes: RationalClasses<A, B>,
  side: number,
  budget: Budget,
): readonly NormalizedDegree[] {
  const written = new WrittenDegrees();
  for (const [degree, word] of tower(classes, side, budget)) written.put(degree, word);
  const { rational, minusOne } = classes;
  const terms = classes.sides[side] ?? [];
  const rank = BigInt(classes.image(terms, residueRing<B, Int>(rankRing, minusOne), budget).get(0) ?? 0);
  const ring = residueRing(
    signatureRing<B>((unit) => rational(unit).negative),
    minusOne,
  );
  const signatures = classes.image(terms, ring, budget);
  for (const degree of new Set([...signatures.keys(), 0]))
    written.put(degree, constantPart(degree, BigInt(signatures.get(degree) ?? 0), rank));
  return written.forms(true);
}

/** The class of B_n with this signature and, for n = 0, this rank. */
export function constantPart(degree: number, signature: bigint, rank: bigint): Expression {
  if (degree > 0) {
    const c = signature / (-2n) ** BigInt(degree);
    return c === 0n ? total([]) : multiple(c, symbolFactors(minusOneElement, degree));
  }
  if (degree < 0) return signature === 0n ? total([]) : multiple(signature, etaFactors(-degree));
  const minus = (rank - signature) / 2n;
  const words = minus === 0n ? [] : [multiple(minus, [...etaFactors(1), ...symbolFactors(minusOneElement, 1)])];
  return total(rank === 0n ? words : [multiple(rank, []), ...words]);
}

/** The products [p]·r̃_p with their degree, largest prime first. */
function* tower<A, B extends Visited>(
  classes: RationalClasses<A, B>,
  side: number,
  budget: Budget,
): Generator<readonly [number, Expression]> {
  const { rational, image } = classes;
  const sight = incidence(classes, 'all', budget);
  const base: BaseElement[] = [...sight.base];
  const indexOf = new Map(base.map(({ value }, index) => [value, index]));
  const pending = base.map((): Term<RationalEntry>[] => []); // what lifts have brought
  const queue = [...base.map(({ value }) => value)]; // ascending; the next prime is the last

  const indexOfPrime = (p: bigint): number => {
    const known = indexOf.get(p);
    if (known !== undefined) return known;
    const index = base.push({ value: p, prime: true }) - 1;
    indexOf.set(p, index);
    pending.push([]);
    let at = queue.length;
    while (at > 0 && (queue[at - 1] ?? 0n) > p) at -= 1;
    queue.splice(at, 0, p);
    return index;
  };
  const entries = new Map<bigint, RationalEntry>();
  const entryOf = (n: bigint): RationalEntry => {
    const known = entries.get(n);
    if (known !== undefined) return known;
    const entry = rationalEntry({ num: n, den: 1n });
    entry.exponents = factor(n, budget).flatMap(({ prime, exponent }) => [indexOfPrime(prime), exponent]);
    entries.set(n, entry);
    return entry;
  };

  for (let p = queue.pop(); p !== undefined; p = queue.pop()) {
    budget.spend('building the tower of residues');
    const index = indexOfPrime(p);
    const field = primeResidueField(p);
    const { units, local } = rationalPlace(base, index);
    const ring = thetaRing<RationalEntry, Int>(units, local);
    const residues = evaluate(pending[index] ?? [], ring, budget);
    const own = image(
      index < sight.base.length ? sight.terms(side, index) : [],
      thetaRing<B, Int>(units, (unit) => local(rational(unit))),
      budget,
    );
    for (const [degree, value] of own) accumulate(residues, degree, value, ring);
    for (const [degree, { d }] of residues) {
      if (d === undefined) continue;
      const prefix = [symbol([integerElement(p)])];
      yield [degree, writeResidueClass(field, degree - 1, d, prefix)];
      for (const word of residueWords(degree - 1, d, {
        nonSquare: field.nonSquare,
        orderModFour: orderModFour(field),
      })) {
        const lift = word.symbol ?? word.angle;
        if (lift === undefined) continue; // [p]ηᵏ ramifies at p only
        const entry = entryOf(BigInt(lift));
        const term: Term<RationalEntry> = {
          coefficient: toInt(-word.coefficient),
          eta: word.eta,
          angles: word.angle === undefined ? [] : [entry],
          factors: [
            { kind: 'symbol', entry: entryOf(p) },
            ...(word.symbol === undefined ? [] : [{ kind: 'symbol' as const, entry }]),
          ],
        };
        forEachExponent(entry, (other) => pending[other]?.push(term));
      }
    }
  }
}
