import { elementText } from '../expression/to-text';
import { writeMultivariate, writtenSign } from '../field/write-multivariate';
import { scaleMulti } from '../field/multivariate';
import { multiplySign, reduceSign, characteristicClass, type SignClass } from '../ring/sign-ring';
import { countBits, type Words } from '../ring/word-ring';
import type { Finding } from './finding';
import type { Separation } from './letters-places';
import type { LettersStatement } from './letters-statement';
import { writeWords } from './letters-words';

/** A difference of the sides at the end of a chain of residues and specialisations. */
export function separationFinding({ ring, characteristic }: LettersStatement, found: Separation): Finding {
  const steps = found.path.map((step) => {
    if (step.kind === 'infinity') return `infinity in ${ring.letters[step.letter] ?? ''}`;
    return elementText(writeMultivariate(ring, scaleMulti(ring, BigInt(writtenSign(ring, step.at)), step.at)));
  });
  if (found.prime !== undefined) steps.push(found.prime.toString());
  const p = found.prime ?? characteristic;
  const constants = p === 0n ? '\\mathbb{Q}' : `\\mathbb{F}_{${p}}`;
  const signs = found.prime === undefined && characteristic === 0n;
  return {
    map: found.path.some(({ kind }) => kind === 'residue') || found.prime !== undefined ? 'residue' : 'specialisation',
    place: steps.join(', then '),
    degree: found.degree,
    same: false,
    zero: false,
    sameModEta: found.zeroModEta,
    sameModH: found.zeroModH,
    left: () => found.left(),
    right: () => found.right(),
    target: () => `K^{\\mathrm{MW}}_{${found.own}}(${constants})`,
    reason: () =>
      `These are values at the end of a chain of residues and specialisations${signs ? ', of which the signs are compared' : ''}.`,
  };
}

/**
 * The residues of an equality that is known to hold, at the factors of its entries: of the word b[P][p_S] it is b[p_S], with the
 * entries reduced modulo P (F. Morel, LNM 2052, Theorem 3.15, number from memory).
 */
export function residueFindings(
  { generators, characteristic }: LettersStatement,
  degree: number,
  words: Words | undefined,
): readonly Finding[] {
  const char = characteristicClass(characteristic);
  const elements = generators.map(({ element }) => element);
  return generators.flatMap((generator, i): readonly Finding[] => {
    if (generator.kind === 'integer') return [];
    const bit = 1n << BigInt(i);
    const residue = new Map<bigint, SignClass>();
    for (const [mask, b] of words ?? []) {
      if ((mask & bit) === 0n) continue;
      // ε for every letter that [P] passes on its way to the front
      const own = degree - countBits(mask);
      const odd = countBits(mask & (bit - 1n)) % 2 === 1;
      const value = reduceSign(char, own, odd ? multiplySign(0, { x: -1n, y: -1n }, own, b) : b);
      if (value !== undefined) residue.set(mask ^ bit, value);
    }
    const value = (): ReturnType<typeof writeWords> => writeWords(elements, degree - 1, residue);
    return [
      {
        map: 'residue',
        place: elementText(generator.element),
        degree,
        same: true,
        zero: residue.size === 0,
        sameModEta: true,
        sameModH: true,
        left: value,
        right: value,
        target: () => `K^{\\mathrm{MW}}_{${degree - 1}}(\\kappa)`,
        reason: () => '',
      },
    ];
  });
}
