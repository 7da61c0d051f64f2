import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import { elementText } from '../expression/to-text';
import type { Field } from './field';
import { degree, monic, type Polynomial } from './polynomial';
import { readModulus } from './read-modulus';
import { writePolynomial } from './write-polynomial';

/** What reading a modulus over a field needs to know beside the field. */
export interface ModulusReading<E> {
  /** An irreducible polynomial of degree 2, for messages. */
  example(): Polynomial<E>;
  /** Refuses a monic modulus that is too large. */
  checkSize?(modulus: Polynomial<E>, at: Span | undefined): void;
  /** A monic irreducible factor of a monic polynomial, `undefined` when it is irreducible itself. */
  factor(f: Polynomial<E>, doing: string): Polynomial<E> | undefined;
}

/**
 * The modulus in base[letter]/(modulus), made monic. Refuses (`field`) a letter that the base has, and a modulus that is 0, constant,
 * reducible or no polynomial; `readModulus` says what else.
 */
export function checkedModulus<E>(
  base: Field<E>,
  letter: string,
  written: Element,
  reading: ModulusReading<E>,
  budget: Budget,
  at: Span | undefined,
): Polynomial<E> {
  if (base.letter(letter) !== undefined) {
    const other = [...'yxwvutsrqp'].find((free) => base.letter(free) === undefined);
    const fact = `The letter ${letter} is used twice: ${base.name} has it already.`;
    throw new Refusal('field', `${fact} Take another letter, such as ${other}.`, at);
  }
  const where = written.at ?? at;
  const modulus = readModulus(written, base, letter, budget);
  const text = short(elementText(written));
  if (modulus.length < 2) {
    const fact = modulus.length === 0 ? `The modulus is 0 over ${base.name}.` : `The modulus ${text} is a constant.`;
    const example = short(elementText(writePolynomial(base, reading.example(), letter)));
    throw new Refusal(
      'field',
      `${fact} Type an irreducible polynomial in ${letter}, such as ${example}, or ${base.name} itself.`,
      where,
    );
  }
  const unitary = monic(base, modulus);
  reading.checkSize?.(unitary, where);
  const factor = reading.factor(unitary, `deciding whether ${text} is irreducible over ${base.name}`);
  if (factor === undefined) return unitary;
  const fact = `${text} has the ${named(base, factor, letter)} over ${base.name}.`;
  throw new Refusal('field', `${fact} Type an irreducible polynomial, or ${base.name} itself.`, where);
}

/** A factor as it is named in a message: of degree 1 by its root. */
function named<E>(base: Field<E>, factor: Polynomial<E>, letter: string): string {
  return degree(factor) === 1
    ? `root ${short(elementText(base.write(base.negate(factor[0]!))))}`
    : `factor ${short(elementText(writePolynomial(base, factor, letter)))}`;
}

/** A number or polynomial in a message, cut short when it is long. */
export function short(what: bigint | string): string {
  const text = what.toString();
  return text.length <= 60 ? text : `${text.slice(0, 57)}…`;
}
