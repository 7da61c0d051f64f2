import type fc from 'fast-check';
import { unlimited } from '@/engine/arith/budget';
import type { Residue, ResiduesOutcome } from '@/engine/decide/outcome';
import { residues } from '@/engine/decide/residues';
import type { Element } from '@/engine/expression/element';
import type { Expression } from '@/engine/expression/expression';
import { expressionText } from '@/engine/expression/to-text';
import { readElement, readExpression } from '@/grammar/read';
import { field } from './kmw-engine';
import { fieldRow } from './kmw-fields';

/** A place of a field of rational functions, its residue field and what t becomes there; `infinity` has no value of t. */
export interface PlaceRow {
  readonly place: string;
  readonly residueField: string;
  readonly uniformizer: string;
  readonly t?: string;
}

/** A field of rational functions with some of its places. A new field is one row. */
export interface FunctionRow {
  readonly name: string;
  readonly base: string;
  readonly places: readonly PlaceRow[];
  /** Degrees of classes whose residues are known completely. */
  readonly top: number;
}

const at = (base: string, ...places: readonly (readonly [place: string, root?: string])[]): readonly PlaceRow[] => [
  ...places.map(([place, root]) => ({
    place,
    uniformizer: place,
    residueField: root === undefined ? `${base}[y]/(${place.replaceAll('t', 'y')})` : base,
    t: root ?? 'y',
  })),
  { place: 'infinity', uniformizer: '1/t', residueField: base },
];

export const functionRows: readonly FunctionRow[] = [
  { name: 'F_2(t)', base: 'F_2', places: at('F_2', ['t', '0'], ['t+1', '1'], ['t^2+t+1'], ['t^3+t+1']), top: 3 },
  { name: 'F_3(t)', base: 'F_3', places: at('F_3', ['t+1', '2'], ['t^2+1'], ['t^2+t+2']), top: 3 },
  { name: 'F_4(t)', base: 'F_4', places: at('F_4', ['t+z', 'z'], ['t^2+t+z']), top: 3 },
  { name: 'F_7(t)', base: 'F_7', places: at('F_7', ['t+4', '3'], ['t^2+1'], ['t^3+2']), top: 3 },
  { name: 'F_9(t)', base: 'F_9', places: at('F_9', ['t+z', '-z'], ['t^2+z+1'], ['t^3+2t+1']), top: 3 },
  {
    name: 'Q(t)',
    base: 'Q',
    places: at('Q', ['t-1', '1'], ['t+1/2', '-1/2'], ['t^2+1'], ['t^2-2'], ['t^2+1/3'], ['t^3-2']),
    top: 2,
  },
];

/** Random units of a field of rational functions. */
export const unitsOf = ({ name }: FunctionRow): fc.Arbitrary<Element> => fieldRow(name).unit;

/** Residue and specialisation, read back from the texts the engine answers. */
export interface AtPlace {
  readonly d: Expression;
  readonly s: Expression;
  readonly answer: Residue;
}

export function residuesOver(
  name: string,
  expression: Expression | string,
  places?: readonly string[],
  uniformizer?: string,
): ResiduesOutcome {
  const tree = typeof expression === 'string' ? readExpression(expression) : expression;
  const asked = places?.map((text) => ({ text, element: () => readElement(text) }));
  const parameter = uniformizer === undefined ? undefined : readElement(uniformizer);
  return residues(field(name), tree, { places: asked, uniformizer: parameter }, unlimited);
}

export function atPlace(name: string, place: string, expression: Expression | string, uniformizer?: string): AtPlace {
  const [answer, other] = residuesOver(name, expression, [place], uniformizer).residues;
  if (answer === undefined || other !== undefined) throw new RangeError('not one residue for one place');
  return {
    d: readExpression(expressionText(answer.value)),
    s: readExpression(expressionText(answer.specialisation)),
    answer,
  };
}

/** Puts an element for the letter t. */
export function valueAt(e: Element, t: Element): Element {
  switch (e.kind) {
    case 'integer':
      return e;
    case 'letter':
      return e.name === 't' ? t : e;
    case 'negate':
      return { ...e, of: valueAt(e.of, t) };
    case 'sum':
      return { ...e, terms: e.terms.map((term) => valueAt(term, t)) };
    case 'product':
      return { ...e, factors: e.factors.map((factor) => valueAt(factor, t)) };
    case 'quotient':
      return { ...e, numerator: valueAt(e.numerator, t), denominator: valueAt(e.denominator, t) };
    case 'power':
      return { ...e, base: valueAt(e.base, t) };
  }
}

/** An expression over a residue field lifted as it is written: y becomes t. */
export function lifted(e: Expression): Expression {
  return readExpression(expressionText(e).replaceAll('y', 't'));
}
