import type { Budget } from '../arith/budget';
import { negateInt } from '../arith/int';
import { integerElement, letterElement, quotientElement, type Element } from '../expression/element';
import { elementText } from '../expression/to-text';
import { factorOverFinite } from '../field/factor-finite';
import type { FunctionEntry } from '../place/function-entry';
import { infinitePlace, type FunctionPlace } from '../place/function-place';
import { thetaRing, type LocalEntry, type Theta } from '../place/theta-ring';
import { unitPower } from '../place/unit-power';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import { writeResidueClass } from '../ring/write-residue-class';
import { total } from '../ring/write-word';
import { checkOnePlace, noUniformizer, readFunctionPlaces, type AskedPlace } from './asked-place';
import type { FiniteFunctionStatement } from './finite-function-statement';
import type { Residue, ResiduesOutcome } from './outcome';
import { unitReader } from './read-unit';

/**
 * Residue and specialisation of a class of K^MW_*(k(t)), k finite, at the places asked for or at every place where it ramifies, infinity
 * included. Uniformizers by default: P, and 1/t at infinity. Against uπ in place of π the residue is multiplied by ⟨ū⟩
 * (F. Morel, LNM 2052, ch. 3). A `uniformizer` goes with exactly one place.
 */
export function finiteFunctionResidues<E>(
  statement: FiniteFunctionStatement<E>,
  asked: readonly AskedPlace[] | undefined,
  uniformizer: Element | undefined,
  budget: Budget,
): ResiduesOutcome {
  const { base, functions, sight } = statement;
  const inSight = statement.order();
  const infinity = infinitePlace(base, quotientElement(integerElement(1n), letterElement(functions.generator)));
  const at = (place: Placed, typed?: Element): Residue =>
    place === 'infinity'
      ? residueAt(statement, infinity, typed, budget)
      : residueAt(statement, statement.place(place), typed, budget);

  if (asked !== undefined) {
    const factor = (f: Parameters<typeof sight.index>[0]) => factorOverFinite(base, f, budget).factors;
    const places = readFunctionPlaces(functions, asked, factor, budget).map((place): Placed =>
      place === 'infinity' ? place : sight.index(place),
    );
    if (uniformizer !== undefined) checkOnePlace(places.length, uniformizer);
    const listed = new Set(places);
    const others = [...inSight, 'infinity' as const].filter((place) => !listed.has(place));
    return {
      residues: places.map((place) => at(place, uniformizer)),
      unramifiedElsewhere: others.every((place) => at(place).zero),
    };
  }
  if (uniformizer !== undefined) checkOnePlace(undefined, uniformizer);
  const all: readonly Placed[] = [...inSight, 'infinity'];
  return { residues: all.map((place) => at(place)).filter(({ zero }) => !zero), unramifiedElsewhere: true };
}

/** The index of a place among those in sight, or infinity. */
type Placed = number | 'infinity';

function residueAt<E, K>(
  { sides, sight, written }: FiniteFunctionStatement<E>,
  place: FunctionPlace<E, K>,
  typed: Element | undefined,
  budget: Budget,
): Residue {
  const [terms = []] = sides;
  const against = typed && sight.entry(unitReader(written, budget)(typed), typed.at);
  const local = against === undefined ? place.local : againstParameter(place, against, typed);
  const value = evaluate(terms, thetaRing(place.units, local), budget);
  const uniformizer = typed === undefined ? place.uniformizer : written.write(unitReader(written, budget)(typed));
  return describe(place, uniformizer, value, degreesOf(terms)[0] ?? 0);
}

/** Entries as aⁿ-multiples of another uniformizer π·w: the unit part loses wⁿ. */
function againstParameter<E, K>(
  place: FunctionPlace<E, K>,
  parameter: FunctionEntry<E>,
  typed: Element | undefined,
): (entry: FunctionEntry<E>) => LocalEntry<K> {
  const { valuation, unit: w } = place.local(parameter);
  if (valuation !== 1 && typed !== undefined)
    throw noUniformizer(typed, `${valuation}`, place.name, elementText(place.uniformizer));
  return (entry) => {
    const found = place.local(entry);
    if (found.valuation === 0) return found;
    const unit = place.field.multiply(found.unit, unitPower(place.field, w, negateInt(found.valuation)));
    return { valuation: found.valuation, unit, squareClass: place.field.isSquare(unit) ? 0 : 1 };
  };
}

function describe<E, K>(
  { name, field }: FunctionPlace<E, K>,
  uniformizer: Element,
  value: Graded<Theta<K>>,
  topDegree: number,
): Residue {
  const degrees = [...value.keys()].sort((a, b) => b - a);
  const ramified = degrees.filter((degree) => value.get(degree)?.d !== undefined);
  return {
    place: name,
    residueField: field.name,
    uniformizer,
    value: total(degrees.map((degree) => writeResidueClass(field, degree - 1, value.get(degree)?.d))),
    degree: (ramified[0] ?? topDegree) - 1,
    zero: ramified.length === 0,
    specialisation: total(degrees.map((degree) => writeResidueClass(field, degree, value.get(degree)?.s))),
  };
}
