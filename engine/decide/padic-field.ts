import type { Budget } from '../arith/budget';
import type { Int } from '../arith/int';
import { integerElement, negateElement, type Element } from '../expression/element';
import { angle, integer, product, symbol, type Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { rationals } from '../field/rational';
import { localSquares, orderAt } from '../place/local-squares';
import type { RationalEntry } from '../place/rational-entry';
import { primeResidueField } from '../place/prime-residue-field';
import { localEntry, primeUnits } from '../place/rational-place';
import { thetaRing } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { localInvariants, localWittRing, type LocalInvariants, type WittVector } from '../ring/local-witt-ring';
import type { ResidueClass } from '../ring/residue-class-ring';
import { rankRing } from '../ring/signature-ring';
import type { Term } from '../ring/term';
import { writeResidueClass } from '../ring/write-residue-class';
import { etaFactors, isZero, minusOneElement, multiple, total } from '../ring/write-word';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import type { Finding } from './finding';
import type { NormalizedDegree } from './outcome';
import { productClasses, productFinding, productValue } from './product-finding';
import { rationalDerivation } from './rational-derivation';
import { rankFinding } from './real-findings';
import { rationalStatement, type RationalStatement } from './rational-statement';

type Terms = readonly Term<RationalEntry>[];

const integerOf = (n: bigint): Element => (n < 0n ? negateElement(integerElement(-n)) : integerElement(n));

/**
 * ℚ_p with rational entries. Degree ≤ 0: rank, discriminant and Hasse invariant (J.-P. Serre, A Course in Arithmetic, IV.2.3,
 * Theorem 7). Degree 1: the product of the entries and the Witt class. Degree 2: K^M_2(ℚ_p) is μ(ℚ_p) plus a uniquely divisible
 * group (C. Moore; J. Milnor, Introduction to Algebraic K-Theory, Appendix), and rational symbols are torsion, so the tame symbol
 * decides for odd p and the Hilbert symbol for p = 2. Degree ≥ 3: 0, for I³(ℚ_p) = 0 and K^M_n is uniquely divisible.
 *
 * Canonical forms, with ρ = ηᵏ[a][b] the generator of I²(ℚ_p), [p][s] for odd p (s the least non-residue), [−1][−1] for p = 2:
 * degree 2: [p][u], or [−1][−1]; degree 1: [x] + c·ηρ; degree n ≤ 0: r·η⁻ⁿ + η¹⁻ⁿ[d] + c·η²⁻ⁿρ with r the rank (modulo 2 for
 * n < 0), d a representative of the square classes, c in {0, 1}.
 */
export function padicField(p: bigint): DecidableField {
  const squares = localSquares(p);
  const ring = localWittRing<RationalEntry>(squares, (entry) => squares.classOf(entry.value));
  const tame = thetaRing<RationalEntry, Int>(primeUnits(p), ({ value }) => localEntry(value, p, orderAt(value, p)));
  const nonResidue = squares.representatives[1] ?? 1n;
  const rho = p === 2n ? [minusOneElement, minusOneElement] : [integerElement(p), integerElement(nonResidue)];
  const tex = `\\mathbb{Q}_{${p}}`;

  const invariants = (vector: WittVector | undefined): LocalInvariants =>
    localInvariants(squares, vector ?? new Array<number>(squares.size).fill(0));
  const tameSymbols = (terms: Terms, budget: Budget): ResidueClass<Int> | undefined =>
    p === 2n ? undefined : evaluate(terms, tame, budget).get(2)?.d;
  const square = (c: number): Element => integerOf(squares.representatives[c] ?? 1n);

  return {
    name: `Q_${p}`,
    tex,
    decide(left, right, conditions, budget) {
      const statement = read([left, right], conditions, budget);
      const [l = [], r = []] = statement.sides;
      const [lw, rw] = [evaluate(l, ring, budget), evaluate(r, ring, budget)];
      const findings = degreesOf([...l, ...r]).flatMap((degree): readonly Finding[] => {
        if (degree > 2) return [pairFinding('class', degree, integer(0n), integer(0n), '0', true, true)];
        if (degree === 2 && p !== 2n) return [tameFinding(tameSymbols(l, budget), tameSymbols(r, budget))];
        const values = [invariants(lw.get(degree)), invariants(rw.get(degree))] as const;
        return [
          ...(degree === 1 ? [degreeOneProduct(statement, values, budget)] : []),
          ...(degree === 0 ? [rankFinding(l, r, budget)] : []),
          ...wittFindings(degree, ...values),
        ];
      });
      return { findings, theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      const statement = read([expression], conditions, budget);
      const [terms = []] = statement.sides;
      const witt = evaluate(terms, ring, budget);
      const rank = BigInt(evaluate(terms, rankRing, budget).get(0) ?? 0);
      return degreesOf(terms)
        .map((degree): NormalizedDegree => {
          const value = witt.get(degree) ?? [];
          const normalForm =
            degree > 2
              ? total([])
              : degree === 2
                ? degreeTwo(tameSymbols(terms, budget), value)
                : degree === 1
                  ? degreeOne(statement, value, budget)
                  : lowDegree(degree, degree === 0 ? rank : undefined, value);
          return { degree, normalForm, canonical: true };
        })
        .filter(({ normalForm }) => !isZero(normalForm));
    },
    derivation: (expression, form, _conditions, budget) =>
      rationalDerivation(
        expression,
        form,
        'rank, discriminant, Hasse invariant and the symbols of degrees 1 and 2',
        budget,
      ),
    sideConditions: () => [],
  };

  /** The product of the entries; modulo h only its square class is left. */
  function degreeOneProduct(
    statement: RationalStatement,
    [left, right]: readonly [LocalInvariants, LocalInvariants],
    budget: Budget,
  ): Finding {
    const finding = productFinding(statement, `${tex}^{\\times}`, budget);
    return { ...finding, sameModH: left.discriminant === right.discriminant };
  }

  function wittFindings(degree: number, left: LocalInvariants, right: LocalInvariants): readonly Finding[] {
    const findings: Finding[] = [];
    if (degree < 0)
      findings.push(
        pairFinding(
          'rank',
          degree,
          integer(BigInt(left.rank)),
          integer(BigInt(right.rank)),
          '\\mathbb{Z}/2',
          true,
          left.rank === right.rank,
        ),
      );
    if (degree < 1) {
      const same = left.discriminant === right.discriminant;
      const write = (c: number): Expression => angle([square(c)]);
      const target = `${tex}^{\\times}/${tex}^{\\times 2}`;
      const finding = pairFinding(
        'discriminant',
        degree,
        write(left.discriminant),
        write(right.discriminant),
        target,
        true,
        same,
      );
      findings.push({ ...finding, zero: left.discriminant === 0 && right.discriminant === 0 });
    }
    const hasse = (bit: 0 | 1): Expression => multiple(bit === 0 ? 1n : -1n, []);
    // in degree 2 over ℚ_2 the Hilbert symbol is also the class modulo η
    const sameHasse = left.hasse === right.hasse;
    const finding = pairFinding(
      'hasse',
      degree,
      hasse(left.hasse),
      hasse(right.hasse),
      '\\{\\pm 1\\}',
      degree < 2 || sameHasse,
      sameHasse,
    );
    findings.push({ ...finding, zero: left.hasse === 0 && right.hasse === 0 });
    return findings.map((found) => ({ ...found, place: p.toString() }));
  }

  function tameFinding(left: ResidueClass<Int> | undefined, right: ResidueClass<Int> | undefined): Finding {
    const write = (x: ResidueClass<Int> | undefined): Expression => writeResidueClass(primeResidueField(p), 1, x);
    const same = left?.unit === right?.unit;
    const sameModH = same || (left?.squareClass ?? 0) === (right?.squareClass ?? 0);
    return {
      ...pairFinding('residue', 2, write(left), write(right), `\\mathbb{F}_{${p}}^{\\times}`, same, sameModH),
      place: p.toString(),
    };
  }

  function degreeTwo(tameSymbol: ResidueClass<Int> | undefined, value: WittVector): Expression {
    if (p !== 2n) return writeResidueClass(primeResidueField(p), 1, tameSymbol, [symbol([integerElement(p)])]);
    return invariants(value.length === 0 ? undefined : value).hasse === 1
      ? product(rho.map((a) => symbol([a])))
      : total([]);
  }

  function degreeOne(statement: RationalStatement, value: WittVector, budget: Budget): Expression {
    const { base, products } = productClasses(statement, budget);
    const x = productValue(base, products[0]);
    const rest = new Array<number>(squares.size).fill(0).map((_, c) => value[c] ?? 0);
    const at = squares.classOf(x);
    rest[at] = ((rest[at] ?? 0) - 1) & 7;
    rest[0] = ((rest[0] ?? 0) + 1) & 7;
    return total([
      ...(rationals.equal(x, rationals.one) ? [] : [symbol([rationals.write(x)])]),
      ...(invariants(rest).hasse === 1 ? [rhoTimes(1)] : []),
    ]);
  }

  function lowDegree(degree: number, rank: bigint | undefined, value: WittVector): Expression {
    const rest = new Array<number>(squares.size).fill(0).map((_, c) => value[c] ?? 0);
    const parity = BigInt(invariants(rest).rank);
    const r = rank ?? parity;
    rest[0] = ((rest[0] ?? 0) - Number(BigInt.asUintN(3, r))) & 7;
    const { discriminant, hasse } = invariants(rest);
    return total([
      ...(r === 0n ? [] : [multiple(r, etaFactors(-degree))]),
      ...(discriminant === 0 ? [] : [multiple(1n, [...etaFactors(1 - degree), symbol([square(discriminant)])])]),
      ...(hasse === 0 ? [] : [rhoTimes(2 - degree)]),
    ]);
  }

  function rhoTimes(etas: number): Expression {
    return multiple(1n, [...etaFactors(etas), ...rho.map((a) => symbol([a]))]);
  }
}

const THEOREM =
  'Forms over Q_p are classified by rank, discriminant and Hasse invariant (J.-P. Serre, A Course in Arithmetic, IV.2.3), K_2 of Q_p is ' +
  'its roots of unity plus a uniquely divisible group (C. Moore; J. Milnor, Introduction to Algebraic K-Theory, Appendix), and rational ' +
  'symbols are torsion in K_2 (Tate). With the pull-back theorem (F. Morel, Comment. Math. Helv. 79, 2004) this is complete for rational entries.';

function read(expressions: readonly Expression[], conditions: readonly Condition[], budget: Budget): RationalStatement {
  checkConcreteConditions(rationals, conditions, budget);
  return rationalStatement(expressions, budget);
}

function pairFinding(
  map: Finding['map'],
  degree: number,
  left: Expression,
  right: Expression,
  target: string,
  sameModEta: boolean,
  sameModH: boolean,
): Finding {
  return {
    map,
    degree,
    same: sameModEta && sameModH,
    zero: isZero(left) && isZero(right),
    sameModEta,
    sameModH,
    left: () => left,
    right: () => right,
    target: () => target,
    reason: () => `The two values in degree ${degree} differ.`,
  };
}
