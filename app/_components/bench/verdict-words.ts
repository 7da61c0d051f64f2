import type { CompareAnswer, ComparedPart } from '@/lib/contracts/compare';
import type { NormalizeAnswer } from '@/lib/contracts/normalize';
import type { Answer } from './ask';
import { degreeName, degreesName, inDegrees } from './degrees';
import { contributions, mapWord, placeTex, placeWords } from './map-words';
import { type Phrase, tex, withFormulas } from './phrase';
import { valuesTex } from './values-tex';

export const verdictWord = { equal: 'Equal', different: 'Different', undecided: 'Undecided' } as const;

const degreesOf = (parts: readonly { readonly degree: number }[]): number[] => parts.map((part) => part.degree);

/** Degrees in which something is there to be compared; all of them when both sides are zero everywhere. */
function degreesInSight(parts: readonly ComparedPart[]): number[] {
  const present = parts.filter((part) => part.compared.some((one) => !one.zero));
  return degreesOf(present.length > 0 ? present : parts);
}

function equalPhrase(answer: CompareAnswer): Phrase {
  const degrees = degreesInSight(answer.parts);
  const maps = contributions(answer.parts.flatMap((part) => part.compared.map((one) => one.map)));
  const where = degrees.length === 0 ? 'Both sides are zero.' : `${inDegrees(degrees)}.`;
  const any = answer.field.text === 'any';
  if (any) return [`${where} It holds over every field in which the side conditions hold.`];
  return [
    `${where} Over `,
    tex(answer.field.tex),
    maps === '' ? ' nothing is left to compare.' : ` the comparison is complete: ${maps}.`,
  ];
}

const nounOf = (map: keyof typeof mapWord): string =>
  map === 'class' ? 'class' : map === 'word' ? 'the term' : mapWord[map];

/** Why the two values differ: what the service says after naming them. */
function reasonOf({ sentence, right, place }: NonNullable<CompareAnswer['evidence']['separating']>): Phrase {
  const named = `right side ${right.text}. `;
  const end = sentence.lastIndexOf(named);
  if (end < 0) return [];
  const said = ` ${sentence.slice(end + named.length)}`;
  if (place === undefined || !isPolynomial(place)) return withFormulas(said);
  return said
    .split(place)
    .flatMap((words, index) => [...(index > 0 ? placePhrase(place) : []), ...withFormulas(words)]);
}

/** Whether a place is written as a polynomial, to be set. */
const isPolynomial = (place: string): boolean => !/^(\d+|real|infinity)$/.test(place);

const placePhrase = (place: string): Phrase => [isPolynomial(place) ? tex(placeTex(place)) : placeWords(place)];

function differentPhrase(answer: CompareAnswer): Phrase {
  const { separating } = answer.evidence;
  const degrees = degreesOf(answer.parts.filter((part) => part.verdict === 'different'));
  if (!separating) return [`${inDegrees(degrees)}.`];
  const { counterexample } = answer.evidence;
  const failing: Phrase = counterexample
    ? [
        '. It fails over ',
        tex(counterexample.field.tex),
        ...(counterexample.values.length === 0 ? [] : [' with ', tex(valuesTex(counterexample.values))]),
      ]
    : [];
  const at: Phrase =
    separating.place === undefined ? ['. The'] : [', at ', ...placePhrase(separating.place), '. There the'];
  return [
    `in ${degreeName(separating.degree)}`,
    ...failing,
    ...at,
    ` left side has ${nounOf(separating.map)} `,
    tex(separating.left.tex),
    ' and the right side ',
    tex(separating.right.tex),
    '.',
    ...reasonOf(separating),
  ];
}

/** What is left of a difference modulo η and modulo h; nothing when neither quotient is known to see the sides agree. */
export function quotientWords(modEta: boolean | undefined, modH: boolean | undefined): string {
  if (modEta && modH === false) return 'Modulo η, in Milnor K-theory, the sides agree; in the Witt ring they do not.';
  if (modH && modEta === false) return 'In the Witt ring the sides agree; modulo η, in Milnor K-theory, they do not.';
  return '';
}

/** The sentence that finishes the word on the tile. */
export function verdictPhrase(answer: CompareAnswer): Phrase {
  if (answer.verdict === 'equal') return equalPhrase(answer);
  if (answer.verdict === 'different') return differentPhrase(answer);
  const open = degreesOf(answer.parts.filter((part) => part.verdict === 'undecided'));
  const { tried } = answer.evidence;
  const none = tried ? 'No lawful substitution at hand' : 'No invariant at hand';
  const reached = [tried?.limit.reached, tried?.proof?.limit.reached].filter(Boolean).length;
  const ended = ['', ' One of the two searches ended at its limit.', ' Both searches ended at their limits.'][reached];
  return [`${inDegrees(open)}. ${none} separates the sides, and no relation at hand joins them.${ended}`];
}

/** The same for a chain, of which the first wrong step is shown. */
export function chainPhrase(answer: CompareAnswer): Phrase {
  const count = answer.chain?.length ?? 0;
  const wrong = answer.firstWrong;
  if (wrong === undefined)
    return [answer.verdict === 'equal' ? `in all ${count} steps: ` : 'in some step: ', ...verdictPhrase(answer)];
  return [`at step ${wrong + 1} of ${count}: `, ...verdictPhrase(answer)];
}

/** The sentence under a canonical form. */
export function formPhrase(answer: NormalizeAnswer): Phrase {
  const [first, ...more] = answer.parts;
  if (!first) return ['is its canonical form: the class is zero over ', tex(answer.field.tex), '.'];
  const degrees = degreesOf(answer.parts);
  const start = `is its ${answer.parts.every((part) => part.canonical) ? 'canonical form' : 'form as a word'}, ${inDegrees(degrees)}. `;
  if (!answer.parts.every((part) => part.canonical))
    return [`${start}Other words can stand for the same class; ask for an equality to be sure.`];
  if (more.length === 0)
    return [`${start}Two elements of `, tex(first.group.tex), ' are equal exactly when these forms are the same.'];
  return [
    `${start}Two elements over `,
    tex(answer.field.tex),
    ' are equal exactly when these forms are the same in each degree.',
  ];
}

/** What is announced once an answer is steady: "Equal, in degrees 2 and 0." */
export function announcement(answer: Answer): string {
  if (answer.kind === 'expression') {
    const degrees = degreesOf(answer.body.parts);
    return degrees.length === 0 ? 'The class is zero.' : `Canonical form, in ${degreesName(degrees)}.`;
  }
  const { body } = answer;
  const word = verdictWord[body.verdict];
  if (body.firstWrong !== undefined && body.chain && body.chain.length > 1)
    return `${word}, first at step ${body.firstWrong + 1}.`;
  const separating = body.evidence.separating;
  if (separating) {
    const at = separating.place === undefined ? '' : `, at ${placeWords(separating.place)}`;
    return `${word}, in ${degreeName(separating.degree)}${at}.`;
  }
  const degrees =
    body.verdict === 'equal'
      ? degreesInSight(body.parts)
      : degreesOf(body.parts.filter((part) => part.verdict === body.verdict));
  return degrees.length === 0 ? `${word}.` : `${word}, in ${degreesName(degrees)}.`;
}
