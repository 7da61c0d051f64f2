import type { Budget } from '@/engine/arith/budget';
import { normalize } from '@/engine/decide/normalize';
import type { Step } from '@/engine/decide/outcome';
import { elementText } from '@/engine/expression/to-text';
import { engineVersion } from '@/engine/version';
import type { DerivationStep, NormalizeAnswer, NormalizeRequest } from '@/lib/contracts/normalize';
import { problemOf } from '@/lib/contracts/problem';
import { Declined } from './declined';
import { fieldOf } from './fields';
import { isEquation, type Reader } from './read';
import { showCondition, showExpression, showField, showGroup } from './show';

/** The canonical form of an expression over a field. An equation is declined with a pointer to where it is judged. */
export function answerNormalize(body: NormalizeRequest, reader: Reader, budget: Budget): NormalizeAnswer {
  if (isEquation(body.expression))
    throw new Declined(
      problemOf(
        'invalid',
        'This is an equation, and an equation has no canonical form. Ask /api/v1/compare about it.',
        {
          part: 'expression',
        },
      ),
    );
  const expression = reader.expression('expression', body.expression);
  const conditions = reader.conditions(body.hypotheses);
  const resolved = fieldOf(reader.fieldName(body.field), budget);
  const { field } = resolved;
  const outcome = normalize(field, expression, { steps: body.steps ?? false, conditions }, budget);
  return {
    engine: engineVersion,
    field: showField(resolved),
    expression: showExpression(expression),
    parts: outcome.parts.map(({ degree, normalForm, canonical }) => ({
      degree,
      normalForm: showExpression(normalForm),
      canonical,
      group: showGroup(field.tex, degree),
    })),
    sideConditions: outcome.sideConditions.map(showCondition),
    ...(outcome.steps === undefined ? {} : { steps: outcome.steps.map(showStep) }),
  };
}

const showStep = ({ relation, args, before, after }: Step): DerivationStep => ({
  relation,
  args: args.map(elementText),
  before: showExpression(before),
  after: showExpression(after),
});
