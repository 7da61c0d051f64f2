import type { Budget } from '../arith/budget';
import { toInt, type Int } from '../arith/int';
import { isPrime } from '../arith/prime';
import { integerElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { shownElement } from '../expression/shown';
import { rationals, type Rational } from '../field/rational';
import { primeResidueField } from '../place/prime-residue-field';
import type { RationalEntry } from '../place/rational-entry';
import { quadraticClass, rationalPlace, unitModulo } from '../place/rational-place';
import { thetaRing, type LocalEntry, type Theta } from '../place/theta-ring';
import { valuation } from '../arith/valuation';
import { powerModulo } from '../arith/modular';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import { writeResidueClass } from '../ring/write-residue-class';
import { total } from '../ring/write-word';
import { isInfinity, type AskedPlace } from './asked-place';
import type { Residue, ResiduesOutcome } from './outcome';
import { wordClasses } from './rational-classes';
import { incidence, rationalStatement } from './rational-statement';
import { unitReader } from './read-unit';

/**
 * Residue and specialisation of a class of K^MW_*(ℚ) at primes: at those asked for, or at every prime where it ramifies.
 * Against uπ in place of π the residue is multiplied by ⟨ū⟩ (F. Morel, LNM 2052, ch. 3).
 * `places` are primes in decimal digits; a `uniformizer` goes with exactly one place.
 */
export function rationalResidues(
  expression: Expression,
  places: readonly AskedPlace[] | undefined,
  uniformizer: Element | undefined,
  budget: Budget,
): ResiduesOutcome {
  const asked = places?.map(({ text }) => readPrime(text, budget));
  const typed = uniformizer && readUniformizer(uniformizer, asked, budget);
  const statement = rationalStatement([expression], budget);
  const [terms = []] = statement.sides;
  const sight = incidence(wordClasses(statement), 'all', budget);
  const indexOf = new Map(sight.base.map(({ value }, index) => [value, index]));

  const at = (p: bigint, parameter?: Rational): Residue => {
    const index = indexOf.get(p);
    const base = index === undefined ? [...sight.base, { value: p, prime: true }] : sight.base;
    const place = rationalPlace(base, index ?? sight.base.length);
    const local = parameter === undefined ? place.local : against(parameter, p, place.local);
    const value = evaluate(terms, thetaRing(place.units, local), budget);
    return describe(
      p,
      value,
      parameter === undefined ? integerElement(p) : rationals.write(parameter),
      degreesOf(terms)[0] ?? 0,
    );
  };

  if (asked !== undefined) {
    const listed = new Set(asked);
    const unramifiedElsewhere = sight.base.every(({ value }) => listed.has(value) || at(value).zero);
    return { residues: [...listed].map((p) => at(p, typed)), unramifiedElsewhere };
  }
  const residues = sight.base.map(({ value }) => at(value)).filter((residue) => !residue.zero);
  return { residues, unramifiedElsewhere: true };
}

function describe(p: bigint, value: Graded<Theta<Int>>, uniformizer: Element, topDegree: number): Residue {
  const field = primeResidueField(p);
  const degrees = [...value.keys()].sort((a, b) => b - a);
  const ramified = degrees.filter((degree) => value.get(degree)?.d !== undefined);
  return {
    place: p.toString(),
    residueField: field.name,
    uniformizer,
    value: total(degrees.map((degree) => writeResidueClass(field, degree - 1, value.get(degree)?.d))),
    degree: (ramified[0] ?? topDegree) - 1,
    zero: ramified.length === 0,
    specialisation: total(degrees.map((degree) => writeResidueClass(field, degree, value.get(degree)?.s))),
  };
}

/** Entries as aⁿ-multiples of another uniformizer π = p·w: the unit part loses wⁿ. */
function against(
  parameter: Rational,
  p: bigint,
  local: (entry: RationalEntry) => LocalEntry<Int>,
): (entry: RationalEntry) => LocalEntry<Int> {
  const w = BigInt(unitModulo(parameter, p, 1));
  return (entry) => {
    const { valuation: n, unit } = local(entry);
    const changed = n === 0 ? unit : toInt((BigInt(unit) * powerModulo(w, -BigInt(n), p)) % p);
    return { valuation: n, unit: changed, squareClass: quadraticClass(changed, p) };
  };
}

function readPrime(text: string, budget: Budget): bigint {
  const trimmed = text.trim();
  if (/^real$/i.test(trimmed) || isInfinity(trimmed))
    throw new Refusal('place', 'The real place of Q has no residue. Name a prime, such as 7.');
  if (!/^[0-9]{1,2000}$/.test(trimmed) || !isPrime(BigInt(trimmed), budget))
    throw new Refusal('place', `${shown(trimmed)} is no place of Q. Name a prime, such as 7.`);
  return BigInt(trimmed);
}

const shown = (text: string): string =>
  text.length > 40 ? `${text.slice(0, 40)}…` : text === '' ? 'An empty text' : text;

function readUniformizer(element: Element, asked: readonly bigint[] | undefined, budget: Budget): Rational {
  const [p] = asked ?? [];
  if (p === undefined || new Set(asked).size !== 1)
    throw new Refusal(
      'uniformizer',
      'A uniformizer goes with exactly one place. Name that place in places.',
      element.at,
    );
  const value = unitReader(rationals, budget)(element);
  const order = valuation(value.num, p).exponent - valuation(value.den, p).exponent;
  if (order !== 1)
    throw new Refusal(
      'uniformizer',
      `${shownElement(element)} has valuation ${order} at ${p}, so it is no uniformizer there. Take ${p} times a unit at ${p}.`,
      element.at,
    );
  return value;
}
