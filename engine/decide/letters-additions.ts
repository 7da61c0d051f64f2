import {
  constantFunction,
  multiplyFunctions,
  polynomialFunction,
  powerFunction,
  type LetterFunction,
} from '../field/letter-function';
import {
  addMulti,
  coefficientsIn,
  degreeIn,
  letterPower,
  lettersIn,
  multiplyMulti,
  negateMulti,
  scaleMulti,
  type MultiPolynomial,
} from '../field/multivariate';
import type { LettersStatement } from './letters-statement';

/** Units that are no factors of entries, and functions x of which 1 − x may be a product of units too. */
export interface Additions {
  readonly units: readonly LetterFunction[];
  readonly candidates: readonly LetterFunction[];
}

/** More than this many sums are not taken apart, nor longer ones. */
const SUMS = 6;
const LONGEST = 6;

const sumsOf = ({ generators }: LettersStatement): readonly MultiPolynomial[] =>
  generators.flatMap((generator) => (generator.kind === 'polynomial' ? [generator.value] : []));

/** The letters that occur in sums only: so the relation of ⟨a⟩ + ⟨b⟩ and ax² + by² has x and y in it. */
export function loneLetters(statement: LettersStatement): Additions {
  const { ring, generators } = statement;
  const alone = new Set(generators.flatMap((generator) => (generator.kind === 'letter' ? [generator.letter] : [])));
  const letters = new Set(sumsOf(statement).flatMap((f) => lettersIn(ring, f)));
  const units = [...letters]
    .filter((letter) => !alone.has(letter))
    .map((letter) => polynomialFunction(ring, letterPower(ring, letter)));
  return { units, candidates: [] };
}

/** For a factor P = Ax² + Bx + C the square it is completed to: 4AP = (2Ax + B)² − (B² − 4AC). Not in characteristic 2. */
export function completedSquares(statement: LettersStatement): Additions {
  const { ring } = statement;
  const units: LetterFunction[] = [];
  const candidates: LetterFunction[] = [];
  if (ring.characteristic === 2n) return { units, candidates };
  for (const f of sumsOf(statement).slice(0, SUMS))
    for (const letter of lettersIn(ring, f)) {
      if (degreeIn(f, letter) !== 2) continue;
      const parts = coefficientsIn(f, letter);
      const [a = [], b = [], c = []] = [parts.get(2), parts.get(1), parts.get(0)];
      const root = addMulti(ring, scaleMulti(ring, 2n, multiplyMulti(ring, a, letterPower(ring, letter))), b);
      const product = scaleMulti(ring, -4n, multiplyMulti(ring, a, c));
      const discriminant = addMulti(ring, multiplyMulti(ring, b, b), product);
      if (discriminant.length === 0) continue;
      const [r, d] = [polynomialFunction(ring, root), polynomialFunction(ring, discriminant)];
      units.push(r, d, constantFunction(ring, { num: 2n, den: 1n }));
      candidates.push(multiplyFunctions(ring, powerFunction(ring, r, 2n), powerFunction(ring, d, -1n)));
    }
  return { units, candidates };
}

/** For a factor P with a term m the rest P − m: m/P and (P − m)/P add up to 1. So 1 + a² + b² leads over 1 + a² to 1. */
export function partialSums(statement: LettersStatement): Additions {
  const { ring } = statement;
  const units = new Map<string, LetterFunction>();
  const candidates: LetterFunction[] = [];
  const take = (f: MultiPolynomial): void => {
    if (f.length < 3 || f.length > LONGEST) return;
    const whole = polynomialFunction(ring, f);
    for (const term of f) {
      const rest = addMulti(ring, f, negateMulti(ring, [term]));
      const unit = polynomialFunction(ring, rest);
      const key = [...unit.factors.keys()].join(' ');
      if (units.size >= UNITS) return;
      candidates.push(multiplyFunctions(ring, polynomialFunction(ring, [term]), powerFunction(ring, whole, -1n)));
      if (units.has(key)) continue;
      units.set(key, unit);
      take(rest);
    }
  };
  for (const f of sumsOf(statement).slice(0, SUMS)) take(f);
  return { units: [...units.values()], candidates };
}

const UNITS = 12;
