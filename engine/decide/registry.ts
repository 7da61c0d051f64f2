import type { Budget } from '../arith/budget';
import { isPrime } from '../arith/prime';
import type { FieldName } from '../expression/field-name';
import { Refusal } from '../expression/refusal';
import { fieldNameText } from '../expression/to-text';
import type { FiniteField } from '../field/field';
import { resolveFiniteField } from '../field/resolve-finite';
import { resolveNumberField } from '../field/resolve-number';
import { complexField, realField } from './archimedean-fields';
import type { DecidableField } from './decidable-field';
import { decidableFiniteField } from './finite-field';
import { finiteFunctionField } from './finite-function-field';
import { lettersField } from './letters-field';
import { decidableNumberField } from './number-field';
import { padicField } from './padic-field';
import { rationalField } from './rational-field';
import { rationalFunctionField } from './rational-function-field';

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
      if (name.base.kind === 'rationals') return decidableNumberField(resolveNumberField(name, budget));
      throw notYet(name, 'Extensions of other fields');
    case 'functions':
      if (isFiniteTower(name.base)) return finiteFunctionField(constantsOf(name, budget), name.letter);
      if (name.base.kind === 'rationals') return rationalFunctionField(name.letter);
      throw notYet(name, 'Fields of rational functions');
    case 'any':
      return lettersField(resolveField);
  }
}

/** The field at the bottom of a tower. */
function bottom(name: FieldName): FieldName {
  return name.kind === 'extension' || name.kind === 'functions' ? bottom(name.base) : name;
}

/** Whether a name is that of a finite field, if it is one at all: extensions of 𝔽_q only. */
function isFiniteTower(name: FieldName): boolean {
  return name.kind === 'extension' ? isFiniteTower(name.base) : name.kind === 'finite';
}

/** The finite constants of a field of rational functions, whose letter must be a new one. */
function constantsOf(name: FieldName & { kind: 'functions' }, budget: Budget): FiniteField<unknown> {
  const base = resolveFiniteField(name.base, budget);
  if (base.letter(name.letter) === undefined) return base;
  throw new Refusal(
    'field',
    `${fieldNameText(name)} uses the letter ${name.letter} twice: it already stands for an element of ${base.name}. Choose another letter.`,
    name.at,
  );
}

function notYet(name: FieldName, kind: string): Refusal {
  return new Refusal(
    'not-yet',
    `${kind} such as ${fieldNameText(name)} are read but not decided yet. Decided now: Q, R, C, Q_p, F_q, F_q(t), Q(t), number fields Q[w]/(f) and any.`,
    name.at,
  );
}
