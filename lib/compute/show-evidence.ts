import type { Counterexample, Evidence, NamedField, Tried } from '@/engine/decide/outcome';
import type { CounterexampleAnswer, EvidenceAnswer, TriedAnswer } from '@/lib/contracts/compare';
import type { Typeset } from '@/lib/contracts/typeset';
import { showElement, showExpression, showStatement } from './show';

/** What a verdict rests on, as answers show it. */
export const showEvidence = ({ separating, counterexample, relations, tried, ...rest }: Evidence): EvidenceAnswer => ({
  ...rest,
  ...(separating && {
    separating: { ...separating, left: showExpression(separating.left), right: showExpression(separating.right) },
  }),
  ...(counterexample && { counterexample: showCounterexample(counterexample) }),
  ...(relations && {
    relations: relations.map(({ times, left, right }) => ({
      times: showExpression(times),
      left: showElement(left),
      right: showElement(right),
    })),
  }),
  ...(tried && { tried: showTried(tried) }),
});

const showNamed = ({ name, tex }: NamedField): Typeset => ({ text: name, tex });

const showCounterexample = ({ field, values, statement }: Counterexample): CounterexampleAnswer => ({
  field: showNamed(field),
  values: values.map(({ letter, value }) => ({ letter, ...showElement(value) })),
  statement: showStatement(statement),
});

const showTried = ({ fields, limit, proof }: Tried): TriedAnswer => ({
  limit,
  fields: fields.map(({ field, values }) => ({ field: showNamed(field), values })),
  ...(proof && { proof: { ...proof, generators: proof.generators.map(showElement) } }),
});
