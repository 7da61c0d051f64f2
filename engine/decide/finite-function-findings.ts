import type { Budget } from '../arith/budget';
import { thetaRing } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { fieldUnits } from '../ring/field-units';
import type { Finding } from './finding';
import type { FiniteFunctionStatement } from './finite-function-statement';
import { ResidueClassFinding } from './residue-class-finding';

/**
 * What decides equality in K^MW_n(k(t)) for a finite field k: the specialisation at infinity and the residue at every monic
 * irreducible polynomial at which a term ramifies. 0 → K^MW_n(k) → K^MW_n(k(t)) → ⊕_P K^MW_{n−1}(k[t]/P) → 0 is split exact, and s_∞ is
 * a retraction (J. Milnor, Algebraic K-theory and quadratic forms, Invent. Math. 9, 1970, Theorem 2.3; F. Morel, LNM 2052,
 * Theorem 3.24, number from memory). At each place only the terms that ramify there are visited.
 */
export function finiteFunctionFindings<E>(statement: FiniteFunctionStatement<E>, budget: Budget): readonly Finding[] {
  const { sides, order, base, atInfinity } = statement;
  const [left = [], right = []] = sides;
  const [l, r] = [evaluate(left, atInfinity, budget), evaluate(right, atInfinity, budget)];
  const units = fieldUnits(base);
  const infinity = { map: 'specialisation', place: 'infinity', field: base, units, where: `in ${base.name}` } as const;
  const constants = degreesOf([...left, ...right]).map(
    (degree): Finding => new ResidueClassFinding(infinity, degree, degree, l.get(degree), r.get(degree)),
  );
  return [...constants, ...order().flatMap((index) => residueFindings(statement, index, budget))];
}

function residueFindings<E>(statement: FiniteFunctionStatement<E>, index: number, budget: Budget): readonly Finding[] {
  const { name, field, units, local } = statement.place(index);
  const ring = thetaRing(units, local);
  const [left, right] = [statement.terms(0, index), statement.terms(1, index)];
  const [l, r] = [evaluate(left, ring, budget), evaluate(right, ring, budget)];
  const origin = { map: 'residue', place: name, field, units, where: `modulo ${name}` } as const;
  return degreesOf([...left, ...right]).map(
    (degree) => new ResidueClassFinding(origin, degree, degree - 1, l.get(degree)?.d, r.get(degree)?.d),
  );
}
