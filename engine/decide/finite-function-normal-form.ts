import type { Budget } from '../arith/budget';
import { toInt } from '../arith/int';
import type { Expression } from '../expression/expression';
import { symbol } from '../expression/expression';
import type { FunctionEntry } from '../place/function-entry';
import type { FunctionPlace } from '../place/function-place';
import { thetaRing } from '../place/theta-ring';
import { writePolynomial } from '../field/write-polynomial';
import { evaluate } from '../ring/evaluate';
import { orderModFour } from '../ring/field-units';
import { residueWords } from '../ring/residue-words';
import type { Term } from '../ring/term';
import { writeResidueClass, type WrittenField } from '../ring/write-residue-class';
import type { FiniteFunctionStatement } from './finite-function-statement';
import type { NormalizedDegree } from './outcome';
import { WrittenDegrees } from './written-degrees';

/**
 * The tower normal form over k(t), k finite: α = s_∞(α) + Σ_P [P]·r̃_P, unique, so that two classes are equal iff their forms are
 * identical.
 *
 * The places are taken by decreasing degree, those of one degree by their coefficients from the top; written are the constant first
 * and then the places upwards. r_P is the residue at P of what is left and r̃_P its canonical lift, written with polynomials of
 * degree < deg P; [P]·r̃_P is subtracted, which brings in places of smaller degree only. What is left lies in K^MW(k) and is
 * s_∞(α) with uniformizer 1/t, for the [P] specialise to [1] = 0 there. J. Milnor, Invent. Math. 9 (1970), Theorem 2.3 with its
 * proof; F. Morel, LNM 2052, Theorem 3.24 (number from memory).
 */
export function finiteFunctionNormalForm<E>(
  statement: FiniteFunctionStatement<E>,
  budget: Budget,
): readonly NormalizedDegree[] {
  const written = new WrittenDegrees();
  for (const [degree, word] of tower(statement, budget)) written.put(degree, word);
  const [terms = []] = statement.sides;
  for (const [degree, constant] of evaluate(terms, statement.atInfinity, budget))
    written.put(degree, writeResidueClass(statement.base, degree, constant));
  return written.forms(true);
}

/** The products [P]·r̃_P with their degree, the last place first. */
function* tower<E>(statement: FiniteFunctionStatement<E>, budget: Budget): Generator<readonly [number, Expression]> {
  const { base, sight, functions } = statement;
  const queue = [...statement.order()]; // the next place is the last
  const pending = sight.places.map((_, index) => [...statement.terms(0, index)]);
  /** Takes in the places that an entry has brought. */
  const enqueue = (): void => {
    for (let index = pending.length; index < sight.places.length; index += 1) {
      pending.push([]);
      let at = queue.length;
      while (at > 0 && statement.compare(queue[at - 1] ?? 0, index) > 0) at -= 1;
      queue.splice(at, 0, index);
    }
  };

  for (let index = queue.pop(); index !== undefined; index = queue.pop()) {
    budget.spend('building the tower of residues');
    const place = statement.place(index);
    const field = liftedField(statement, place);
    const entryOf = (residue: unknown): FunctionEntry<E> => {
      const f = place.lift(residue);
      const value =
        f.length === 1 ? { constant: f[0]!, powers: [] } : { constant: base.one, powers: [{ base: f, exponent: 1 }] };
      const entry = sight.entry(value);
      enqueue();
      return entry;
    };
    const own = sight.entry({ constant: base.one, powers: [{ base: sight.places[index]!, exponent: 1 }] });
    const prefix = [symbol([place.uniformizer])];
    for (const [degree, { d }] of evaluate(pending[index] ?? [], thetaRing(place.units, place.local), budget)) {
      if (d === undefined) continue;
      yield [degree, writeResidueClass(field, degree - 1, d, prefix)];
      const { nonSquare } = field;
      for (const word of residueWords(degree - 1, d, { nonSquare, orderModFour: orderModFour(field) })) {
        const lift = word.symbol ?? word.angle;
        if (lift === undefined) continue; // [P]ηᵏ ramifies at P only
        const entry = entryOf(lift);
        const term: Term<FunctionEntry<E>> = {
          coefficient: toInt(-word.coefficient),
          eta: word.eta,
          angles: word.angle === undefined ? [] : [entry],
          factors: [
            { kind: 'symbol', entry: own },
            ...(word.symbol === undefined ? [] : [{ kind: 'symbol' as const, entry }]),
          ],
        };
        for (let i = 0; i < entry.exponents.length; i += 2) pending[Number(entry.exponents[i])]?.push(term);
      }
    }
  }

  function liftedField(
    { functions: { generator } }: FiniteFunctionStatement<E>,
    { field, lift }: FunctionPlace<E, unknown>,
  ): WrittenField<unknown> {
    return {
      name: functions.name,
      order: field.order,
      characteristic: field.characteristic,
      write: (unit) => writePolynomial(base, lift(unit), generator),
      get nonSquare() {
        return field.nonSquare;
      },
    };
  }
}
