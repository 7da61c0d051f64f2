import type { Budget } from '../arith/budget';
import { integerElement } from '../expression/element';
import { moduloFour, xorInt, type Int } from '../arith/int';
import { eta, power, type Expression } from '../expression/expression';
import { primeResidueField } from '../place/prime-residue-field';
import { rationalPlace, unsplitZeroTest, type ZeroTest } from '../place/rational-place';
import type { RationalEntry } from '../place/rational-entry';
import type { Splitting } from '../place/sight';
import { thetaRing, type Theta } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded, GradedRing } from '../ring/graded-ring';
import { residueClassRing, type ResidueClass } from '../ring/residue-class-ring';
import type { Term } from '../ring/term';
import { writeResidueClass } from '../ring/write-residue-class';
import { multiple, zeroExpression } from '../ring/write-word';
import type { Finding } from './finding';
import { incidence, type Incidence, type RationalStatement } from './rational-statement';
import { realFindings } from './real-findings';
import { residueReason } from './residue-reason';

type Terms = readonly Term<RationalEntry>[];

/**
 * What decides equality in K^MW_n(ℚ): the rank (n = 0), the signature, and the residue at every prime at which a term ramifies.
 * 0 → B_n → K^MW_n(ℚ) → ⊕_p K^MW_{n−1}(𝔽_p) → 0 is split exact, with B_n seen by signature and rank
 * (J. Milnor, Introduction to Algebraic K-Theory, §11, after Tate; J. Milnor and D. Husemoller, Symmetric Bilinear Forms, IV.2; with
 * the pull-back theorem, F. Morel, Comment. Math. Helv. 79, 2004; compare H. Kolderup, arXiv:1906.07506).
 *
 * A composite that was not split into primes is compared as a whole; it is split only if that does not settle it.
 */
export function rationalFindings(statement: RationalStatement, budget: Budget): readonly Finding[] {
  const [left = [], right = []] = statement.sides;
  const split = new Set<bigint>();
  for (;;) {
    const at = incidence(statement, split.size === 0 ? 'none' : split, budget);
    const residues = residueFindings(at, budget);
    const findings = [...realFindings(left, right, budget), ...residues];
    const unknown = residues.filter((finding) => finding.outcome === 'unknown');
    const unknownModH = residues.filter((finding) => finding.outcomeModH === 'unknown');
    // a class that is seen to differ modulo h anywhere differs modulo h, whatever else is not known
    const settledModH = unknownModH.length === 0 || findings.some((f) => !f.sameModH && !isUnknownModH(f));
    if (unknown.length === 0 && settledModH) return findings;
    for (const finding of unknown.length > 0 ? unknown : unknownModH) split.add(finding.base);
  }
}

function both<H>(sides: readonly Terms[], ring: GradedRing<RationalEntry, H>, budget: Budget): [Graded<H>, Graded<H>] {
  return [evaluate(sides[0] ?? [], ring, budget), evaluate(sides[1] ?? [], ring, budget)];
}

interface ResidueFinding extends Finding {
  readonly base: bigint;
  readonly outcome: ZeroTest;
  readonly outcomeModH: ZeroTest;
}

const isUnknownModH = (finding: Finding): boolean => 'outcomeModH' in finding && finding.outcomeModH === 'unknown';

function residueFindings({ base, terms }: Incidence, budget: Budget): readonly ResidueFinding[] {
  return base.flatMap(({ value: b, prime }, index) => {
    const { units, local } = rationalPlace(base, index);
    const ring: GradedRing<RationalEntry, Theta<Int>> = thetaRing(units, local);
    const kappa = residueClassRing(units);
    const sides = terms[index] ?? [];
    const [left, right] = both(sides, ring, budget);
    return degreesOf(sides.flat()).map((degree): ResidueFinding => {
      const l = left.get(degree)?.d;
      const r = right.get(degree)?.d;
      const minus = r === undefined ? undefined : kappa.negate(degree - 1, r);
      const difference = l === undefined ? minus : minus === undefined ? l : kappa.add(degree - 1, l, minus);
      const outcome: ZeroTest = prime
        ? difference === undefined
          ? 'zero'
          : 'nonzero'
        : unsplitZeroTest(base, b, degree - 1, difference);
      const asForm = difference && { ...difference, unit: undefined };
      const outcomeModH: ZeroTest =
        outcome === 'zero'
          ? 'zero'
          : prime
            ? zeroModH(difference, units.classOfMinusOne)
            : unsplitZeroTest(base, b, -1, asForm);
      const write = prime ? writeAtPrime(b) : writeUnsplit;
      return {
        map: 'residue',
        place: b.toString(),
        degree,
        base: b,
        outcome,
        outcomeModH,
        same: outcome === 'zero',
        zero: l === undefined && r === undefined,
        sameModEta: outcome === 'zero' || zeroModEta(degree - 1, difference),
        sameModH: outcomeModH === 'zero',
        left: () => write(degree - 1, l),
        right: () => write(degree - 1, r),
        target: () => residueGroup(degree - 1, b, prime),
        reason: () => residueReason(degree - 1, l, r, prime ? `modulo ${b}` : `at a prime that divides ${b}`),
      };
    });
  });
}

/** Whether a class of K^MW_m of a residue field is zero in Milnor K-theory. */
const zeroModEta = (degree: number, x: ResidueClass<Int> | undefined): boolean =>
  x === undefined || (x.unit === undefined && (degree < 0 || x.rank === 0));

/** Whether a class of K^MW_m of a residue field is zero in the Witt ring: even rank and trivial signed discriminant. */
function zeroModH(x: ResidueClass<Int> | undefined, classOfMinusOne: Int): 'zero' | 'nonzero' {
  if (x === undefined) return 'zero';
  const rank = moduloFour(x.rank);
  return rank % 2 === 0 && xorInt(x.squareClass, rank === 2 ? classOfMinusOne : 0) === 0 ? 'zero' : 'nonzero';
}

const writeAtPrime =
  (p: bigint) =>
  (degree: number, x: ResidueClass<Int> | undefined): Expression =>
    writeResidueClass(primeResidueField(p), degree, x);

/** A residue at an unsplit composite: rank and a discriminant that is only known as a product. */
function writeUnsplit(degree: number, x: ResidueClass<Int> | undefined): Expression {
  if (x === undefined) return zeroExpression;
  if (x.unit !== undefined) return multiple(1n, [{ kind: 'symbol', entries: [integerElement(BigInt(x.unit))] }]);
  const etas = degree === 0 ? [] : [degree === -1 ? eta() : power(eta(), -degree)];
  return x.rank === 0 ? zeroExpression : multiple(BigInt(x.rank), etas);
}

function residueGroup(degree: number, b: bigint, prime: boolean): string {
  const field = prime ? `\\mathbb{F}_{${b}}` : `\\mathbb{F}_{p},\\ p \\mid ${b}`;
  if (degree > 1) return '0';
  if (degree === 1) return prime ? `${field}^{\\times}` : `\\mathbb{F}_{p}^{\\times},\\ p \\mid ${b}`;
  return degree === 0 ? `\\mathrm{GW}(${field})` : `\\mathrm{W}(${field})`;
}

