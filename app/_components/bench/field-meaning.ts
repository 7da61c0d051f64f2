import type { Element } from '@/engine/expression/element';
import type { FieldName } from '@/engine/expression/field-name';
import { fieldNameTex } from '@/engine/expression/to-tex';
import type { FieldAnswer } from '@/lib/contracts/typeset';
import { type Phrase, tex } from './phrase';

const words = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

const elements = (order: bigint): string =>
  `${order < 13n ? words[Number(order)] : order.toString().length > 12 ? 'a great many' : order.toString()} elements`;

/** Degree in one letter of a polynomial as it is written, or undefined where it is none. */
export function writtenDegree(element: Element, letter: string): number | undefined {
  switch (element.kind) {
    case 'integer':
      return 0;
    case 'letter':
      return element.name === letter ? 1 : 0;
    case 'negate':
      return writtenDegree(element.of, letter);
    case 'sum':
      return degreeOver(element.terms, letter, (a, b) => (a > b ? a : b));
    case 'product':
      return degreeOver(element.factors, letter, (a, b) => a + b);
    case 'power': {
      const base = writtenDegree(element.base, letter);
      return base === undefined || element.exponent < 0 ? undefined : base * element.exponent;
    }
    case 'quotient':
      return writtenDegree(element.denominator, letter) === 0 ? writtenDegree(element.numerator, letter) : undefined;
  }
}

function degreeOver(
  parts: readonly Element[],
  letter: string,
  join: (a: number, b: number) => number,
): number | undefined {
  let degree = 0;
  for (const part of parts) {
    const one = writtenDegree(part, letter);
    if (one === undefined) return undefined;
    degree = join(degree, one);
  }
  return degree;
}

/** The number of elements of a finite field by its name, undefined for other fields and names past reason. */
export function orderOf(name: FieldName): bigint | undefined {
  if (name.kind === 'finite') return name.order;
  if (name.kind !== 'extension') return undefined;
  const base = orderOf(name.base);
  const degree = writtenDegree(name.modulus, name.letter);
  return base === undefined || degree === undefined || degree > 64 ? undefined : base ** BigInt(degree);
}

function finiteMeaning(name: FieldName, order: bigint | undefined, answer: FieldAnswer | undefined): Phrase {
  const count = order === undefined ? 'a finite field' : elements(order);
  if (name.kind === 'extension')
    return [`${count}; `, tex(name.letter), ' generates it over ', tex(fieldNameTex(name.base))];
  if (!answer?.modulus) return [count];
  return [`${count}; `, tex('z'), ' generates it, with ', tex(`${answer.modulus.tex} = 0`)];
}

/**
 * What the name of a field stands for, as far as the name tells, and with what the service said about it: the modulus is known only there.
 */
export function fieldWords(name: FieldName, answer?: FieldAnswer): Phrase {
  switch (name.kind) {
    case 'rationals':
      return ['the rationals'];
    case 'reals':
      return ['the real numbers; entries are rational'];
    case 'complexes':
      return ['the complex numbers; entries are rational'];
    case 'padics':
      return ['the ', tex(name.prime.toString()), '-adic numbers; entries are rational'];
    case 'finite':
      return finiteMeaning(name, name.order, answer);
    case 'extension': {
      const order = orderOf(name);
      if (order !== undefined || name.base.kind === 'finite') return finiteMeaning(name, order, answer);
      const modulus = answer?.modulus;
      return [
        tex(fieldNameTex(name.base)),
        ' with a root ',
        tex(name.letter),
        modulus ? tex(` of ${modulus.tex}`) : ' of the modulus',
      ];
    }
    case 'functions':
      return ['rational functions in ', tex(name.letter), ' over ', tex(fieldNameTex(name.base))];
    case 'any':
      return ['no field is named: letters are units, and a claim is meant for every field'];
  }
}

/** The same, with what is decided over the field. */
export function fieldMeaning(name: FieldName, answer?: FieldAnswer): Phrase {
  const decided = decidedOver(name);
  return decided === undefined ? fieldWords(name, answer) : [...fieldWords(name, answer), decided];
}

const inEveryDegree = ': complete in every degree';

/** In which degrees everything is decided; nothing for letters and for fields over which nothing is. */
function decidedOver(name: FieldName): string | undefined {
  switch (name.kind) {
    case 'any':
      return undefined;
    case 'functions':
      if (orderOf(name.base) !== undefined) return inEveryDegree;
      return name.base.kind === 'rationals' ? ': complete but for degree 3, which may stay undecided' : undefined;
    case 'extension':
      if (orderOf(name) !== undefined) return inEveryDegree;
      return name.base.kind === 'rationals' ? ': complete but for degree 2, which may stay undecided' : undefined;
    default:
      return inEveryDegree;
  }
}

/** Whether the service has something to add to what the name tells. */
export const needsService = (name: FieldName): boolean =>
  name.kind === 'finite' || name.kind === 'padics' || name.kind === 'extension' || name.kind === 'functions';
