import type { Budget } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import type { Compared, CompareOutcome, ComparedDegree, Verdict } from '@/engine/decide/outcome';
import type { DecidableField } from '@/engine/decide/decidable-field';
import type { Expression } from '@/engine/expression/expression';
import type { Statement } from '@/engine/expression/statement';
import { engineVersion } from '@/engine/version';
import type { CompareAnswer, CompareRequest, ComparedMap, ComparedPart } from '@/lib/contracts/compare';
import { problemOf } from '@/lib/contracts/problem';
import type { Typeset } from '@/lib/contracts/typeset';
import { Declined } from './declined';
import { fieldOf } from './fields';
import { type FormsByDegree, formsOf } from './forms-of-sides';
import type { Reader } from './read';
import { showCondition, showExpression, showField, showGroup, showStatement } from './show';
import { showEvidence } from './show-evidence';

interface Judged {
  readonly left: Expression;
  readonly right: Expression;
  readonly outcome: CompareOutcome;
}

/** The verdict on an equality or on every step of a chain. */
export function answerCompare(body: CompareRequest, reader: Reader, budget: Budget): CompareAnswer {
  const statement = readQuestion(body, reader);
  const resolved = fieldOf(reader.fieldName(body.field), budget);
  const { field } = resolved;
  const judged = steps(statement.sides).map(([left, right]): Judged => ({
    left,
    right,
    outcome: compare(field, left, right, statement.conditions, budget),
  }));
  // The forms are an extra: they are made after every verdict is there, from what is left of the budget.
  const forms = body.forms === true ? formsOf(field, statement, budget) : undefined;
  const shown = judged.map((step, index) => {
    const { counterexample } = step.outcome.evidence;
    if (forms === undefined || counterexample === undefined)
      return showStep(field, step, forms?.[index], forms?.[index + 1]);
    // What is compared belongs to the field of the counterexample; so do the forms beside it.
    const there = fieldOf(reader.fieldName(counterexample.field.name), budget).field;
    return showStep(field, step, ...formsOf(there, counterexample.statement, budget));
  });
  const firstWrong = judged.findIndex(({ outcome }) => outcome.verdict === 'different');
  const leading =
    shown[
      Math.max(
        0,
        judged.findIndex(({ outcome }) => outcome.verdict !== 'equal'),
      )
    ] ?? shown[0];
  if (leading === undefined) throw new Error('A statement without steps was judged.');
  return {
    engine: engineVersion,
    field: showField(resolved),
    statement: showStatement(statement),
    sides: statement.sides.map(showExpression),
    verdict: overall(judged.map(({ outcome }) => outcome.verdict)),
    parts: leading.parts,
    sideConditions: withoutRepetition(judged.flatMap(({ outcome }) => outcome.sideConditions.map(showCondition))),
    evidence: leading.evidence,
    ...(shown.length > 1 ? { chain: shown } : {}),
    ...(firstWrong >= 0 && shown.length > 1 ? { firstWrong } : {}),
  };
}

function readQuestion(body: CompareRequest, reader: Reader): Statement {
  if (body.statement === undefined) {
    const sides = [reader.expression('left', body.left ?? ''), reader.expression('right', body.right ?? '')];
    return { sides, conditions: reader.conditions(body.hypotheses) };
  }
  const { sides, conditions } = reader.statement('statement', body.statement);
  if (sides.length < 2)
    throw new Declined(
      problemOf(
        'invalid',
        'A statement needs an equals sign: “left = right”. Ask /api/v1/normalize for the canonical form of an expression.',
        { part: 'statement' },
      ),
    );
  return { sides, conditions: [...conditions, ...reader.conditions(body.hypotheses)] };
}

function steps(sides: readonly Expression[]): readonly (readonly [Expression, Expression])[] {
  return sides.flatMap((right, index) => {
    const left = sides[index - 1];
    return left === undefined ? [] : [[left, right] as const];
  });
}

const overall = (verdicts: readonly Verdict[]): Verdict =>
  verdicts.includes('different') ? 'different' : verdicts.includes('undecided') ? 'undecided' : 'equal';

function showStep(
  field: DecidableField,
  { left, right, outcome }: Judged,
  leftForms?: FormsByDegree,
  rightForms?: FormsByDegree,
) {
  return {
    left: showExpression(left),
    right: showExpression(right),
    verdict: outcome.verdict,
    parts: outcome.parts.map((part) => showPart(field, part, leftForms, rightForms)),
    evidence: showEvidence(outcome.evidence),
  };
}

const zeroForm = { text: '0', tex: '0', canonical: true };

function showPart(
  field: DecidableField,
  part: ComparedDegree,
  left?: FormsByDegree,
  right?: FormsByDegree,
): ComparedPart {
  const { degree, verdict, compared } = part;
  return {
    degree,
    verdict,
    group: showGroup(field.tex, degree),
    compared: compared.map(showCompared),
    ...(left !== undefined && right !== undefined
      ? { forms: { left: left.get(degree) ?? zeroForm, right: right.get(degree) ?? zeroForm } }
      : {}),
  };
}

const showCompared = ({ left, right, ...rest }: Compared): ComparedMap => ({
  ...rest,
  left: showExpression(left),
  right: showExpression(right),
});

const withoutRepetition = (conditions: readonly Typeset[]): Typeset[] => [
  ...new Map(conditions.map((condition) => [condition.text, condition])).values(),
];
