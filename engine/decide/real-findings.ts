import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import type { Int } from '../arith/int';
import type { Visited } from '../place/theta-ring';
import { evaluate } from '../ring/evaluate';
import { residueRing } from '../ring/residue-ring';
import { rankRing, signatureRing } from '../ring/signature-ring';
import type { Term } from '../ring/term';
import { multiple, zeroExpression } from '../ring/write-word';
import type { Finding } from './finding';
import type { RationalClasses } from './rational-classes';

/** The rank in degree 0, and in every degree the signature at the real place. */
export function realFindings<A, B extends Visited>(classes: RationalClasses<A, B>, budget: Budget): readonly Finding[] {
  const { sides, minusOne, rational } = classes;
  const [left = [], right = []] = sides;
  const signatures = residueRing(
    signatureRing<B>((unit) => rational(unit).negative),
    minusOne,
  );
  const [l, r] = [classes.image(left, signatures, budget), classes.image(right, signatures, budget)];
  return classes.degrees([...left, ...right]).flatMap((degree): readonly Finding[] => {
    const values = [BigInt(l.get(degree) ?? 0), BigInt(r.get(degree) ?? 0)] as const;
    // in degree n ≥ 1 the signature is a multiple of 2ⁿ, and Milnor K-theory sees that multiple modulo 2
    const sameModEta = degree < 1 || (values[0] - values[1]) % 2n ** BigInt(degree + 1) === 0n;
    const signature = integerFinding('signature', degree, values, sameModEta, values[0] === values[1]);
    return [...(degree === 0 ? [rankOfClasses(classes, budget)] : []), { ...signature, place: 'real' }];
  });
}

function rankOfClasses<A, B extends Visited>(classes: RationalClasses<A, B>, budget: Budget): Finding {
  const [left = [], right = []] = classes.sides;
  const ranks = residueRing<B, Int>(rankRing, classes.minusOne);
  const rank = (terms: readonly Term<A>[]): bigint => BigInt(classes.image(terms, ranks, budget).get(0) ?? 0);
  return ranksFinding([rank(left), rank(right)]);
}

/** The ranks of the parts of degree 0. */
export function rankFinding<A>(left: readonly Term<A>[], right: readonly Term<A>[], budget: Budget): Finding {
  const rank = (terms: readonly Term<A>[]): bigint => BigInt(evaluate(terms, rankRing, budget).get(0) ?? 0);
  return ranksFinding([rank(left), rank(right)]);
}

const ranksFinding = (values: readonly [bigint, bigint]): Finding =>
  integerFinding('rank', 0, values, values[0] === values[1], (values[0] - values[1]) % 2n === 0n);

/** Two integers compared. */
export function integerFinding(
  map: 'rank' | 'signature',
  degree: number,
  [left, right]: readonly [bigint, bigint],
  sameModEta: boolean,
  sameModH: boolean,
): Finding {
  const write = (n: bigint): Expression => (n === 0n ? zeroExpression : multiple(n, []));
  return {
    map,
    degree,
    same: left === right,
    zero: left === 0n && right === 0n,
    sameModEta,
    sameModH,
    left: () => write(left),
    right: () => write(right),
    target: () => '\\mathbb{Z}',
    reason: () => `The ${map}s are ${left} and ${right}.`,
  };
}
