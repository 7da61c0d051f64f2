import type { Budget } from '../arith/budget';
import { isPrime } from '../arith/prime';
import type { FieldName } from '../expression/field-name';
import { Refusal } from '../expression/refusal';
import { fieldNameText } from '../expression/to-text';
import { resolveFiniteField } from '../field/resolve-finite';
import { complexField, realField } from './archimedean-fields';
import type { DecidableField } from './decidable-field';
import { decidableFiniteField } from './finite-field';
import { lettersField } from './letters-field';
import { padicField } from './padic-field';
import { rationalField } from './rational-field';

/**
 * The field with a written name. Refuses names that are no fields (`field`, with the reason) and fields that are not decided in
 * this version (`not-yet`).
 */
export function resolveField(name: FieldName, budget: Budget): DecidableField {
  switch (name.kind) {
    case 'rationals':
      return rationalField;
    case 'reals':
      return realField;
    case 'complexes':
      return complexField;
    case 'padics':
      if (!isPrime(name.prime, budget))
        throw new Refusal(
          'field',
          `${name.prime} is not a prime, so there is no field Q_${name.prime}. Type a prime, as in Q_5.`,
          name.at,
        );
      return padicField(name.prime);
    case 'finite':
      return decidableFiniteField(resolveFiniteField(name, budget));
    case 'extension':
      if (bottom(name).kind === 'finite') return decidableFiniteField(resolveFiniteField(name, budget));
      throw notYet(name, 'Number fields');
    case 'functions':
      if (bottom(name).kind === 'finite') checkLetter(name, budget);
      throw notYet(name, 'Fields of rational functions');
    case 'any':
      return lettersField(resolveField);
  }
}

/** The field at the bottom of a tower. */
function bottom(name: FieldName): FieldName {
  return name.kind === 'extension' || name.kind === 'functions' ? bottom(name.base) : name;
}

/** A function field over a finite field: its constants must be a field, and its letter a new one. */
function checkLetter(name: FieldName & { kind: 'functions' }, budget: Budget): void {
  if (name.base.kind === 'functions') return;
  const base = resolveFiniteField(name.base, budget);
  if (base.letter(name.letter) !== undefined)
    throw new Refusal(
      'field',
      `${fieldNameText(name)} uses the letter ${name.letter} twice: it already stands for an element of ${base.name}. Choose another letter.`,
      name.at,
    );
}

function notYet(name: FieldName, kind: string): Refusal {
  return new Refusal(
    'not-yet',
    `${kind} such as ${fieldNameText(name)} are read but not decided yet. Decided now: Q, R, C, Q_p, F_q and any.`,
    name.at,
  );
}
