import { readFieldName } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { Typeset } from '@/lib/contracts/typeset';
import { fieldWords } from '../../bench/field-meaning';
import { placeTex } from '../../bench/map-words';
import { type Phrase, Said, tex } from '../../bench/phrase';

/** `a != 0` says that a letter is a unit. */
const unitLetter = /^(\p{L}[\p{L}\d_']*) (?:!=|≠) 0$/u;

/** Formulas as a list in a sentence: "a, b and c". */
function listedTex(items: readonly string[]): Phrase {
  return items.flatMap((item, index) => {
    const between = index === 0 ? [] : [index === items.length - 1 ? ' and ' : ', '];
    return [...between, tex(item)];
  });
}

/** "every field and every unit a with 1 + a ≠ 0" */
function overAny(conditions: readonly Typeset[]): Phrase {
  const letters = conditions.flatMap(({ text }) => unitLetter.exec(text)?.[1] ?? []);
  const rest = conditions.filter(({ text }) => !unitLetter.test(text)).map((condition) => condition.tex);
  const units: Phrase =
    letters.length === 0 ? [] : [` and ${letters.length === 1 ? 'every unit ' : 'all units '}`, ...listedTex(letters)];
  return ['every field', ...units, ...(rest.length === 0 ? [] : [' with ', ...listedTex(rest)])];
}

function meaning(field: Typeset): Phrase {
  try {
    return [tex(field.tex), ', ', ...fieldWords(readFieldName(field.text))];
  } catch (error) {
    if (error instanceof ReadingError) return [tex(field.tex)];
    throw error;
  }
}

/** The field and the hypotheses, in words. */
function holdsFor(identity: IdentityAnswer): Phrase {
  const { field, hypotheses, place, uniformizer, kind, evidence } = identity;
  const conditions = evidence?.compare?.sideConditions ?? hypotheses;
  if (kind === 'residue')
    return [
      ...meaning(field),
      '; at ',
      tex(placeTex(place?.tex ?? '')),
      ...(uniformizer ? [', against the uniformizer ', tex(uniformizer.tex)] : [', against the usual uniformizer']),
    ];
  if (field.text === 'any') return overAny(conditions);
  return [
    ...meaning(field),
    ...(hypotheses.length === 0 ? [] : ['; with ', ...listedTex(hypotheses.map((one) => one.tex))]),
  ];
}

/** For what the identity is claimed. */
export function HoldsFor({ identity }: { readonly identity: IdentityAnswer }) {
  return (
    <p className="lead">
      <Said phrase={holdsFor(identity)} />.
    </p>
  );
}
