import { integerElement, type Element } from '../expression/element';
import { symbol, type Expression } from '../expression/expression';
import { isZeroModEta, isZeroModH, type CharacteristicClass, type SignClass } from '../ring/sign-ring';
import { countBits, lettersOf, type Words } from '../ring/word-ring';
import { etaFactors, minusOneElement, multiple, symbolFactors, total, zeroExpression } from '../ring/write-word';
import type { Finding } from './finding';

/** The coefficients of every canonical word of one degree, compared. */
export function wordFindings(
  char: CharacteristicClass,
  letters: readonly Element[],
  degree: number,
  left: Words | undefined,
  right: Words | undefined,
): readonly Finding[] {
  const masks = new Set([...(left?.keys() ?? []), ...(right?.keys() ?? [])]);
  if (masks.size === 0) masks.add(0n);
  return sortMasks(masks).map((mask): Finding => {
    const [l, r] = [left?.get(mask), right?.get(mask)];
    const own = degree - countBits(mask);
    const difference: SignClass = { x: (l?.x ?? 0n) - (r?.x ?? 0n), y: (l?.y ?? 0n) - (r?.y ?? 0n) };
    const same = difference.x === 0n && difference.y === 0n;
    const write = (b: SignClass | undefined): Expression =>
      b === undefined ? zeroExpression : total(writeWord(letters, own, mask, b));
    return {
      map: 'word',
      degree,
      same,
      zero: l === undefined && r === undefined,
      sameModEta: same || isZeroModEta(own, difference),
      sameModH: same || isZeroModH(char, own, difference),
      left: () => write(l),
      right: () => write(r),
      target: () => coefficientGroup(char, own),
      reason: () => 'Canonical words in independent letters are a basis, and these coefficients differ.',
    };
  });
}

function coefficientGroup(char: CharacteristicClass, degree: number): string {
  if (degree === 0)
    return char === 'zero'
      ? '\\mathbb{Z}^{2}'
      : char === 'three-mod-four'
        ? '\\mathbb{Z}\\oplus\\mathbb{Z}/2'
        : '\\mathbb{Z}';
  if (char === 'zero') return '\\mathbb{Z}';
  if (degree < 0) return char === 'three-mod-four' ? '\\mathbb{Z}/4' : '\\mathbb{Z}/2';
  return degree === 1 && char !== 'two' ? '\\mathbb{Z}/2' : '0';
}

/** Words with fewer letters first, then by their letters. */
function sortMasks(masks: Iterable<bigint>): readonly bigint[] {
  return [...masks]
    .map((mask) => ({ mask, letters: lettersOf(mask) }))
    .sort(({ letters: x }, { letters: y }) => {
      const at = x.findIndex((letter, i) => letter !== y[i]);
      return x.length - y.length || (at < 0 ? 0 : (x[at] ?? 0) - (y[at] ?? 0));
    })
    .map(({ mask }) => mask);
}

/** The canonical form of the words of one degree. */
export function writeWords(letters: readonly Element[], degree: number, words: Words): Expression {
  return total(
    sortMasks(words.keys()).flatMap((mask) =>
      writeWord(letters, degree - countBits(mask), mask, words.get(mask) ?? { x: 0n, y: 0n }),
    ),
  );
}

/** b·[p_S] for a coefficient b of degree `own`. */
export function writeWord(
  letters: readonly Element[],
  own: number,
  mask: bigint,
  { x, y }: SignClass,
): readonly Expression[] {
  const tail = lettersOf(mask).map((i) => symbol([letters[i] ?? integerElement(1n)]));
  const plain =
    x === 0n
      ? []
      : [
          multiple(x, [
            ...etaFactors(own < 0 ? -own : 0),
            ...symbolFactors(minusOneElement, own > 0 ? own : 0),
            ...tail,
          ]),
        ];
  return y === 0n ? plain : [...plain, multiple(y, [...etaFactors(1), ...symbolFactors(minusOneElement, 1), ...tail])];
}
