import type { Budget } from '../arith/budget';
import { integerElement } from '../expression/element';
import type { Int } from '../arith/int';
import { angle, symbol, type Expression } from '../expression/expression';
import { primeResidueField } from '../place/prime-residue-field';
import { maskedProduct, rationalPlace, unsplitZeroTest, type ZeroTest } from '../place/rational-place';
import type { RationalEntry } from '../place/rational-entry';
import type { BaseElement, Splitting } from '../place/sight';
import { thetaRing, type Visited } from '../place/theta-ring';
import { differenceIn, zeroModEta, zeroModH } from '../ring/residue-class-quotients';
import { residueClassRing, type ResidueClass } from '../ring/residue-class-ring';
import { writeResidueClass } from '../ring/write-residue-class';
import { etaFactors, multiple, total, zeroExpression } from '../ring/write-word';
import type { Finding } from './finding';
import type { RationalClasses } from './rational-classes';
import { incidence } from './rational-statement';
import { realFindings } from './real-findings';
import { residueReason } from './residue-reason';

/**
 * What decides equality in K^MW_n(ℚ): the rank (n = 0), the signature, and the residue at every prime at which a term ramifies.
 * 0 → B_n → K^MW_n(ℚ) → ⊕_p K^MW_{n−1}(𝔽_p) → 0 is split exact, with B_n seen by signature and rank
 * (J. Milnor, Introduction to Algebraic K-Theory, §11, after Tate; J. Milnor and D. Husemoller, Symmetric Bilinear Forms, IV.2; with
 * the pull-back theorem, F. Morel, Comment. Math. Helv. 79, 2004; compare H. Kolderup, arXiv:1906.07506).
 *
 * A composite that was not split into primes is compared as a whole; it is split only if that does not settle it.
 */
export function rationalFindings<A, B extends Visited>(
  classes: RationalClasses<A, B>,
  budget: Budget,
): readonly Finding[] {
  const real = realFindings(classes, budget);
  const split = new Set<bigint>();
  for (;;) {
    const residues = residueFindings(classes, split.size === 0 ? 'none' : split, budget);
    const open = unsettled(real, residues);
    if (open.length === 0) return [...real, ...residues.filter(({ outcome }) => outcome !== 'unknown')];
    for (const { base } of open) split.add(base);
  }
}

/**
 * The residues at unsplit composites that still matter. One that is not known may be left out only where its degree is seen to
 * differ without it, and where what it could change modulo η and modulo h is settled by others.
 */
function unsettled(real: readonly Finding[], residues: readonly ResidueFinding[]): readonly ResidueFinding[] {
  const known = [...real, ...residues.filter(({ outcome }) => outcome !== 'unknown')];
  const different = new Set(known.filter(({ same }) => !same).map(({ degree }) => degree));
  const differentModEta = known.some(({ sameModEta }) => !sameModEta);
  const differentModH = known.some((finding) => !finding.sameModH && !isUnknownModH(finding));
  return residues.filter(({ degree, outcome, outcomeModH, sameModEta }) =>
    outcome === 'unknown'
      ? !different.has(degree) || (!sameModEta && !differentModEta) || (outcomeModH !== 'zero' && !differentModH)
      : outcomeModH === 'unknown' && !differentModH,
  );
}

const isUnknownModH = (finding: Finding): boolean =>
  finding instanceof ResidueFinding && finding.outcomeModH === 'unknown';

function residueFindings<A, B extends Visited>(
  classes: RationalClasses<A, B>,
  split: Splitting,
  budget: Budget,
): readonly ResidueFinding[] {
  const { base, terms } = incidence(classes, split, budget);
  const { entries, rational, image, degrees } = classes;
  const findings: ResidueFinding[] = [];
  base.forEach((element, index) => {
    const { units, local } = rationalPlace(base, index);
    const ring = thetaRing<B, Int>(units, (unit) => local(rational(unit)));
    const [left, right] = [terms(0, index), terms(1, index)];
    const l = left.length === 0 ? undefined : image(left, ring, budget);
    const r = right.length === 0 ? undefined : image(right, ring, budget);
    for (const degree of degrees(left.length === 0 ? right : right.length === 0 ? left : [...left, ...right])) {
      const [x, y] = [l?.get(degree)?.d, r?.get(degree)?.d];
      const difference = y === undefined ? x : differenceIn(residueClassRing(units), degree - 1, x, y);
      findings.push(new ResidueFinding(base, entries, element, degree, x, y, difference, units.classOfMinusOne));
    }
  });
  return findings;
}

/** The residues of both sides at one element of the base; a class, so that what is only shown is worked out on demand. */
class ResidueFinding implements Finding {
  readonly map = 'residue';
  readonly outcome: ZeroTest;

  constructor(
    private readonly sight: readonly BaseElement[],
    private readonly entries: readonly RationalEntry[],
    private readonly element: BaseElement,
    readonly degree: number,
    private readonly x: ResidueClass<Int> | undefined,
    private readonly y: ResidueClass<Int> | undefined,
    private readonly difference: ResidueClass<Int> | undefined,
    private readonly classOfMinusOne: Int,
  ) {
    this.outcome = element.prime
      ? difference === undefined
        ? 'zero'
        : 'nonzero'
      : unsplitZeroTest(sight, entries, element.value, degree - 1, difference);
  }

  get base(): bigint {
    return this.element.value;
  }
  get place(): string {
    return this.base.toString();
  }
  get same(): boolean {
    return this.outcome === 'zero';
  }
  get zero(): boolean {
    return this.x === undefined && this.y === undefined;
  }
  get sameModEta(): boolean {
    return this.same || zeroModEta(this.degree - 1, this.difference);
  }
  get sameModH(): boolean {
    return this.outcomeModH === 'zero';
  }
  get outcomeModH(): ZeroTest {
    if (this.same) return 'zero';
    if (this.element.prime) return zeroModH(this.difference, this.classOfMinusOne) ? 'zero' : 'nonzero';
    const asForm = this.difference && { ...this.difference, unit: undefined };
    return unsplitZeroTest(this.sight, this.entries, this.base, -1, asForm);
  }
  left(): Expression {
    return this.write(this.x);
  }
  right(): Expression {
    return this.write(this.y);
  }
  target(): string {
    return residueGroup(this.degree - 1, this.base, this.element.prime);
  }
  reason(): string {
    const where = this.element.prime ? `modulo ${this.base}` : `at a prime that divides ${this.base}`;
    return residueReason(this.degree - 1, this.x, this.y, where);
  }
  private write(value: ResidueClass<Int> | undefined): Expression {
    return this.element.prime
      ? writeResidueClass(primeResidueField(this.base), this.degree - 1, value)
      : writeUnsplit(this.sight, this.base, this.degree - 1, value);
  }
}

/** A residue at an unsplit composite: its rank, and its discriminant as a residue modulo the composite. */
function writeUnsplit(
  sight: readonly BaseElement[],
  b: bigint,
  degree: number,
  x: ResidueClass<Int> | undefined,
): Expression {
  if (x === undefined) return zeroExpression;
  if (x.unit !== undefined) return symbol([integerElement(BigInt(x.unit))]);
  const mask = BigInt(x.squareClass);
  const plain = BigInt(x.rank) - (mask === 0n ? 0n : 1n);
  const etas = etaFactors(-degree);
  const form = mask === 0n ? [] : [multiple(1n, [...etas, angle([integerElement(maskedProduct(sight, b, mask))])])];
  return total([...(plain === 0n ? [] : [multiple(plain, etas)]), ...form]);
}

function residueGroup(degree: number, b: bigint, prime: boolean): string {
  const field = prime ? `\\mathbb{F}_{${b}}` : `\\mathbb{F}_{p},\\ p \\mid ${b}`;
  if (degree > 1) return '0';
  if (degree === 1) return prime ? `${field}^{\\times}` : `\\mathbb{F}_{p}^{\\times},\\ p \\mid ${b}`;
  return degree === 0 ? `\\mathrm{GW}(${field})` : `\\mathrm{W}(${field})`;
}
