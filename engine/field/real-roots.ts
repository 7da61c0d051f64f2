import type { Budget } from '../arith/budget';
import { positiveRoots, seenFrom, signAt, signChanges, type Dyadic } from './descartes';
import { derivativeInteger, exactQuotient, primitivePart, type IntegerPolynomial } from './integer-polynomial';
import { gcdIntegers } from './modular-gcd';
import { rational, type Rational } from './rational';

type Sign = -1 | 0 | 1;

/** A real root of a polynomial over ℤ. */
export interface RealRoot {
  /** Rational numbers around the root with no other root between; the root itself, twice, when it was met exactly. */
  readonly low: Rational;
  readonly high: Rational;
  /** The sign of a polynomial over ℤ at the root. */
  signOf(g: IntegerPolynomial): Sign;
}

/** The different real roots of f ≠ 0, ascending. */
export function realRoots(f: IntegerPolynomial, budget: Budget, doing = 'finding real roots'): readonly RealRoot[] {
  const spend = (): void => budget.spend(doing);
  spend();
  if (f.length < 2) return [];
  const primitive = primitivePart(f);
  const repeated = gcdIntegers(primitive, primitivePart(derivativeInteger(primitive)), spend);
  let rest = repeated.length === 1 ? primitive : exactQuotient(primitive, repeated, spend)!;
  const points: Dyadic[] = [];
  const meet = (root: Dyadic): void => {
    points.push(root);
    const { numerator, exponent } = root;
    const factor = exponent < 0 ? [-numerator << BigInt(-exponent), 1n] : [-numerator, 1n << BigInt(exponent)];
    rest = exactQuotient(rest, primitivePart(factor), spend)!;
  };
  if (rest[0] === 0n) meet({ numerator: 0n, exponent: 0 });
  for (;;) {
    if (rest.length < 2) return sorted(points.map((at) => new Point(at)));
    const right = positiveRoots(rest, spend);
    if ('root' in right) {
      meet(right.root);
      continue;
    }
    const mirrored = rest.map((c, i) => (i % 2 === 0 ? c : -c));
    const left = positiveRoots(mirrored, spend);
    if ('root' in left) {
      meet({ ...left.root, numerator: -left.root.numerator });
      continue;
    }
    const negative = left.intervals.map(({ numerator, exponent }) => ({ numerator: -numerator - 1n, exponent }));
    const isolated = [...negative, ...right.intervals].map((at) => new Isolated(rest, at, spend));
    for (const root of isolated) for (const point of points) root.avoid(point);
    return sorted([...isolated, ...points.map((at) => new Point(at))]);
  }
}

/** The number of different real roots of f ≠ 0. */
export const countRealRoots = (f: IntegerPolynomial, budget: Budget): number => realRoots(f, budget).length;

const sorted = (roots: readonly RealRoot[]): readonly RealRoot[] =>
  [...roots].sort((a, b) => (compare(a.low, b.low) === 0 ? compare(a.high, b.high) : compare(a.low, b.low)));

function compare(a: Rational, b: Rational): number {
  const difference = a.num * b.den - b.num * a.den;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

const value = (numerator: bigint, exponent: number): Rational =>
  exponent < 0 ? rational(numerator << BigInt(-exponent)) : rational(numerator, 1n << BigInt(exponent));

/** A root that is a number with a power of 2 below. */
class Point implements RealRoot {
  readonly low: Rational;
  readonly high: Rational;

  constructor(private readonly at: Dyadic) {
    this.low = this.high = value(at.numerator, at.exponent);
  }

  signOf(g: IntegerPolynomial): Sign {
    return signAt(g, this.at);
  }
}

/** The only root of a square-free polynomial in an open interval, at whose ends it is not zero. */
class Isolated implements RealRoot {
  private exact = false;

  constructor(
    private readonly f: IntegerPolynomial,
    private at: Dyadic,
    private readonly spend: () => void,
  ) {}

  get low(): Rational {
    return value(this.at.numerator, this.at.exponent);
  }

  get high(): Rational {
    return value(this.at.numerator + (this.exact ? 0n : 1n), this.at.exponent);
  }

  signOf(g: IntegerPolynomial): Sign {
    if (g.length < 2) return signAt(g, this.at);
    const common = gcdIntegers(this.f, primitivePart(g), this.spend);
    // a divisor of f has no root in the interval but this one, and changes its sign there
    if (!this.exact && common.length > 1 && this.signBelow(common) !== this.signAbove(common)) return 0;
    while (!this.exact) {
      if (signChanges(seenFrom(g, this.at, this.spend), this.spend) === 0) return signAt(g, this.middle());
      this.refine();
    }
    return signAt(g, this.at);
  }

  /** Makes the interval small enough not to hold a point that is no root of f. */
  avoid(point: Dyadic): void {
    const { num, den } = value(point.numerator, point.exponent);
    const inside = (): boolean => this.low.num * den < num * this.low.den && num * this.high.den < this.high.num * den;
    while (!this.exact && inside()) this.refine();
  }

  private middle(): Dyadic {
    return { numerator: 2n * this.at.numerator + 1n, exponent: this.at.exponent + 1 };
  }

  private signBelow(f: IntegerPolynomial): Sign {
    return signAt(f, this.at);
  }

  private signAbove(f: IntegerPolynomial): Sign {
    return signAt(f, { numerator: this.at.numerator + 1n, exponent: this.at.exponent });
  }

  private refine(): void {
    this.spend();
    const middle = this.middle();
    const there = signAt(this.f, middle);
    if (there === 0) {
      this.at = middle;
      this.exact = true;
    } else {
      const numerator = there === this.signBelow(this.f) ? middle.numerator : middle.numerator - 1n;
      this.at = { numerator, exponent: middle.exponent };
    }
  }
}
