import type { Budget } from '../arith/budget';
import { isOddInt } from '../arith/int';
import type { Expression } from '../expression/expression';
import { symbol } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { rationals } from '../field/rational';
import type { RationalEntry } from '../place/rational-entry';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import { rankRing, signatureRing } from '../ring/signature-ring';
import type { Term } from '../ring/term';
import { etaFactors, isZero, multiple, total } from '../ring/write-word';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import type { Finding } from './finding';
import type { NormalizedDegree } from './outcome';
import { productClasses, productFinding, productValue } from './product-finding';
import { rationalDerivation } from './rational-derivation';
import { integerFinding, rankFinding, realFindings } from './real-findings';
import { constantPart } from './rational-normal-form';
import { wordClasses } from './rational-classes';
import { rationalStatement, type RationalStatement } from './rational-statement';

const TORSION =
  'Rational symbols are torsion in K_2 (Tate; J. Milnor, Introduction to Algebraic K-Theory, §11), and K^M_n of this field is ' +
  'uniquely divisible for n ≥ 2 up to the part seen by signs. ';

const PULL_BACK =
  'With the pull-back theorem (F. Morel, Comment. Math. Helv. 79, 2004) this is complete for rational entries.';

type Terms = readonly Term<RationalEntry>[];

/** ℝ with rational entries: rank, signature and, in degree 1, the product of the entries. */
export const realField: DecidableField = {
  name: 'R',
  tex: '\\mathbb{R}',
  decide(left, right, conditions, budget) {
    const statement = read([left, right], conditions, budget);
    return {
      findings: [
        ...realFindings(wordClasses(statement), budget),
        ...productFindings(statement, '\\mathbb{R}^{\\times}', budget),
      ],
      theorem: `Forms over R are classified by rank and signature (Sylvester). ${TORSION}${PULL_BACK}`,
    };
  },
  normalForm(expression, conditions, budget) {
    const statement = read([expression], conditions, budget);
    const [terms = []] = statement.sides;
    const rank = BigInt(evaluate(terms, rankRing, budget).get(0) ?? 0);
    const signatures = evaluate(
      terms,
      signatureRing<RationalEntry>((entry) => entry.negative),
      budget,
    );
    const parts: [number, Expression][] = [...new Set([...signatures.keys(), 0])].map((degree) => [
      degree,
      constantPart(degree, BigInt(signatures.get(degree) ?? 0), rank),
    ]);
    const size = positive(unit(statement, budget));
    return collect(size === undefined ? parts : [[1, size], ...parts]);
  },
  derivation: (expression, form, _conditions, budget) =>
    rationalDerivation(expression, form, 'rank, signature and the product of the entries', budget),
  sideConditions: () => [],
};

/** ℂ with rational entries: rank, its parity in negative degrees and, in degree 1, the product of the entries. */
export const complexField: DecidableField = {
  name: 'C',
  tex: '\\mathbb{C}',
  decide(left, right, conditions, budget) {
    const statement = read([left, right], conditions, budget);
    const [l = [], r = []] = statement.sides;
    const [lp, rp] = [parities(l, budget), parities(r, budget)];
    const findings = degreesOf([...l, ...r]).flatMap((degree): readonly Finding[] => {
      if (degree === 1) return [];
      if (degree === 0) return [rankFinding(l, r, budget)];
      const values = degree < 0 ? ([lp.get(degree) ?? 0n, rp.get(degree) ?? 0n] as const) : ([0n, 0n] as const);
      const same = values[0] === values[1];
      const target = degree < 0 ? '\\mathbb{Z}/2' : '0';
      return [{ ...integerFinding('rank', degree, values, true, same), target: () => target }];
    });
    return {
      findings: [...productFindings(statement, '\\mathbb{C}^{\\times}', budget), ...findings],
      theorem: `Forms over C are classified by rank. ${TORSION}${PULL_BACK}`,
    };
  },
  normalForm(expression, conditions, budget) {
    const statement = read([expression], conditions, budget);
    const [terms = []] = statement.sides;
    const rank = BigInt(evaluate(terms, rankRing, budget).get(0) ?? 0);
    const parts: [number, Expression][] = [...parities(terms, budget)]
      .filter(([degree, parity]) => degree < 0 && parity !== 0n)
      .map(([degree]) => [degree, multiple(1n, etaFactors(-degree))]);
    const value = unit(statement, budget);
    if (rank !== 0n) parts.push([0, multiple(rank, [])]);
    if (!rationals.equal(value, rationals.one)) parts.push([1, symbol([rationals.write(value)])]);
    return collect(parts);
  },
  derivation: (expression, form, _conditions, budget) =>
    rationalDerivation(expression, form, 'rank and the product of the entries', budget),
  sideConditions: () => [],
};

function read(expressions: readonly Expression[], conditions: readonly Condition[], budget: Budget): RationalStatement {
  checkConcreteConditions(rationals, conditions, budget);
  return rationalStatement(expressions, budget);
}

function productFindings(statement: RationalStatement, target: string, budget: Budget): readonly Finding[] {
  return degreesOf(statement.sides.flat()).includes(1) ? [productFinding(statement, target, budget)] : [];
}

/** The rank modulo 2 in every degree. */
function parities(terms: Terms, budget: Budget): Graded<bigint> {
  const ranks = evaluate(
    terms,
    signatureRing<RationalEntry>(() => false),
    budget,
  );
  return new Map([...ranks].map(([degree, rank]) => [degree, isOddInt(rank) ? 1n : 0n]));
}

function unit(statement: RationalStatement, budget: Budget): ReturnType<typeof productValue> {
  const { base, products } = productClasses(statement, budget);
  return productValue(base, products[0]);
}

/** [|x|], or nothing for |x| = 1. Over ℝ, [x] = [|x|] + [−1] for x < 0, since ⟨|x|⟩ = 1 there. */
function positive(x: ReturnType<typeof productValue>): Expression | undefined {
  const size = x.num < 0n ? rationals.negate(x) : x;
  return rationals.equal(size, rationals.one) ? undefined : symbol([rationals.write(size)]);
}

function collect(parts: readonly (readonly [number, Expression])[]): readonly NormalizedDegree[] {
  const byDegree = new Map<number, Expression[]>();
  for (const [degree, word] of parts) if (!isZero(word)) byDegree.set(degree, [...(byDegree.get(degree) ?? []), word]);
  return [...byDegree]
    .sort(([a], [b]) => b - a)
    .map(([degree, words]) => ({ degree, normalForm: total(words), canonical: true }));
}
